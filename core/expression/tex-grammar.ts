/** Longest symbol that an engineer may give. */
const MAX_LENGTH = 80;
/** Braces within braces. */
const MAX_DEPTH = 6;

/** Commands that stand for a sign of their own. */
const SIGNS = new Set([
  'alpha', 'beta', 'gamma', 'delta', 'epsilon', 'varepsilon', 'zeta', 'eta', 'theta', 'vartheta', 'iota', 'kappa',
  'lambda', 'mu', 'nu', 'xi', 'pi', 'rho', 'varrho', 'sigma', 'tau', 'upsilon', 'phi', 'varphi', 'chi', 'psi', 'omega',
  'Gamma', 'Delta', 'Theta', 'Lambda', 'Xi', 'Pi', 'Sigma', 'Upsilon', 'Phi', 'Psi', 'Omega',
  'ell', 'infty', 'ast', 'star', 'circ', 'parallel', 'perp', 'prime', 'partial', 'cdot', 'times', 'pm',
]); // prettier-ignore

/** Commands that set what follows in braces in another face. */
const FACES = new Set(['mathrm', 'mathit', 'mathbf', 'mathsf']);

/** Commands that put a mark on what follows, in braces or as one sign. */
const MARKS = new Set(['hat', 'bar', 'tilde', 'dot', 'ddot', 'vec', 'overline', 'underline', 'widehat', ...FACES]);

const SPACES = new Set(['\\,', '\\ ', '\\;']);

type Reading = { readonly tex: string } | { readonly fault: string };

/**
 * Reads TeX of a symbol by a small grammar of its own, so that nothing reaches the typesetter that it could refuse or
 * that could do more than show a symbol.
 */
export function readTexSymbol(text: string): Reading {
  const tex = text.trim();
  if (tex === '') return { fault: 'the symbol is empty' };
  if (tex.length > MAX_LENGTH) return { fault: `the symbol has more than ${MAX_LENGTH} characters` };
  const reader = new SymbolReader(tex.match(/\\[A-Za-z]+|\\.|\s+|[\s\S]/gu) ?? []);
  const fault = reader.row(0) ?? (reader.atEnd() ? null : `\`${reader.peek()}\` closes nothing in the symbol`);
  return fault === null ? { tex } : { fault };
}

class SymbolReader {
  private readonly parts: readonly string[];
  private next = 0;

  constructor(parts: readonly string[]) {
    this.parts = parts;
  }

  atEnd(): boolean {
    return this.next >= this.parts.length;
  }

  peek(): string {
    return this.parts[this.next] ?? '';
  }

  /** Signs with their scripts, up to a closing brace or the end; gives the fault, or null. */
  row(depth: number): string | null {
    if (depth > MAX_DEPTH) return 'the braces of the symbol are nested too deep';
    let empty = true;
    while (!this.atEnd() && this.peek() !== '}') {
      const fault = this.scripted(depth);
      if (fault !== null) return fault;
      empty = false;
    }
    return empty ? 'the symbol has nothing between its braces' : null;
  }

  private scripted(depth: number): string | null {
    const part = this.take();
    if (/^\s+$/.test(part) || SPACES.has(part)) return null;
    const fault = this.sign(part, depth);
    if (fault !== null) return fault;
    const seen = new Set<string>();
    this.skipSpace();
    while (this.peek() === "'") {
      seen.add('^');
      this.take();
    }
    for (this.skipSpace(); this.peek() === '_' || this.peek() === '^'; this.skipSpace()) {
      const script = this.take();
      if (seen.has(script)) return `\`${script}\` stands twice behind the same sign of the symbol`;
      seen.add(script);
      const scriptFault = this.argument(script, depth);
      if (scriptFault !== null) return scriptFault;
    }
    return null;
  }

  private sign(part: string, depth: number): string | null {
    if (/^[A-Za-z0-9.,()+\-*/=|]$/.test(part)) return null;
    if (part === '{') return this.braces(depth);
    const command = part.startsWith('\\') ? part.slice(1) : null;
    if (command !== null && SIGNS.has(command)) return null;
    if (command !== null && MARKS.has(command)) return this.argument(part, depth);
    return `\`${part}\` may not stand in a symbol`;
  }

  /** What a mark or a script applies to: braces, or one plain sign. */
  private argument(of: string, depth: number): string | null {
    this.skipSpace();
    if (this.atEnd()) return `\`${of}\` has nothing behind it in the symbol`;
    const part = this.take();
    if (part === '{') return this.braces(depth);
    const isScript = of === '_' || of === '^';
    // After a mark, TeX would take the bare command for the whole of what is marked.
    if (isScript && part.startsWith('\\') && FACES.has(part.slice(1)) && this.peek() === '{')
      return this.argument(part, depth);
    const isSign = /^[A-Za-z0-9+\-*]$/.test(part) || (part.startsWith('\\') && SIGNS.has(part.slice(1)));
    return isSign ? null : `\`${of}\` has no braces behind it in the symbol`;
  }

  private braces(depth: number): string | null {
    const fault = this.row(depth + 1);
    if (fault !== null) return fault;
    return this.take() === '}' ? null : 'a brace of the symbol is not closed';
  }

  private skipSpace(): void {
    while (/^\s+$/.test(this.peek())) this.next += 1;
  }

  private take(): string {
    const part = this.peek();
    this.next += 1;
    return part;
  }
}
