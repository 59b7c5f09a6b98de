import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { readTexSymbol } from './tex-grammar.ts';

const GREEK_SMALL = [
  'alpha', 'beta', 'gamma', 'delta', 'epsilon', 'zeta', 'eta', 'theta', 'iota', 'kappa', 'lambda', 'mu', 'nu', 'xi',
  'pi', 'rho', 'sigma', 'tau', 'upsilon', 'phi', 'chi', 'psi', 'omega',
] as const; // prettier-ignore
const GREEK_CAPITAL = [
  'Gamma',
  'Delta',
  'Theta',
  'Lambda',
  'Xi',
  'Pi',
  'Sigma',
  'Upsilon',
  'Phi',
  'Psi',
  'Omega',
] as const;

/** Names of Greek letters that TeX knows; the other capitals look like Latin ones. */
const GREEK: ReadonlySet<string> = new Set([...GREEK_SMALL, ...GREEK_CAPITAL]);

/**
 * TeX of a quantity's symbol: the one that the engineer gives, or one made from the name.
 *
 * @param given must have passed {@link checkSymbol}; what has not is left aside
 */
export function symbolFor(name: string, given?: string): string {
  const read = given === undefined ? null : readTexSymbol(given);
  return read !== null && 'tex' in read ? read.tex : symbolFromName(name);
}

/** Says what is wrong with a symbol that an engineer gives: it is TeX of a closed list of commands. */
export function checkSymbol(given: string, span: Span): Diagnostic[] {
  const read = readTexSymbol(given);
  if ('tex' in read) return [];
  return [
    error('EXPRESSION_NOT_ALLOWED', span, read.fault, {
      hints: [
        'a symbol is made of letters, digits, scripts and commands such as `\\Delta`, `\\hat{p}`, `\\mathrm{max}`',
      ],
    }),
  ];
}

/**
 * A name as engineers read it: `p_d` is p with a subscript, `F_lim` has its subscript upright, `omega` is the Greek
 * letter, `Delta_p` is Δp, and a name of several letters such as `dp` stays a word.
 */
function symbolFromName(name: string): string {
  const [head = '', ...rest] = name.split('_').filter((part) => part !== '');
  if (head === 'Delta' && rest.length > 0) return `\\Delta ${symbolFromName(rest.join('_'))}`;
  const [, word = head, digits = ''] = /^([A-Za-z]+)(\d+)$/.exec(head) ?? [];
  const subscripts = [...(digits === '' ? [] : [digits]), ...rest.map(subscript)];
  return subscripts.length === 0 ? letter(word) : `${letter(word)}_{${subscripts.join(',')}}`;
}

function letter(word: string): string {
  if (GREEK.has(word)) return `\\${word}`;
  return word.length > 1 ? `\\mathrm{${word}}` : word;
}

/** Single letters and digits stay italic, as in p_{d} and T_{2d}; words are upright. */
function subscript(part: string): string {
  if (GREEK.has(part)) return `\\${part}`;
  return part.replace(/[^A-Za-z]/g, '').length > 1 ? `\\mathrm{${part}}` : part;
}
