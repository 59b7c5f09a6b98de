import { isAlias, isMap, isScalar, isSeq, parseDocument, type Node, type ParsedNode, type Scalar } from 'yaml';
import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { brokenText, checkText, isBroken, TOO_DEEP, TOO_MANY } from './check-text.ts';
import type { Text } from './document.ts';
import { LIMITS } from './limits.ts';
import { yamlFaults } from './yaml-faults.ts';

type ScalarValue = string | number | boolean | null;

/** A value of the sheet with its place: what YAML nodes become once they are known to be harmless. */
export type Entry =
  | { readonly entry: 'scalar'; readonly span: Span; readonly value: ScalarValue; readonly text: Text }
  | { readonly entry: 'map'; readonly span: Span; readonly pairs: readonly EntryPair[] }
  | { readonly entry: 'list'; readonly span: Span; readonly items: readonly Entry[] };

export interface EntryPair {
  readonly key: Text;
  readonly value: Entry;
}

export interface ReadYaml {
  /** Null where the text is no YAML, or more than a sheet may be. */
  readonly root: Entry | null;
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads YAML 1.2 into entries. Anchors, aliases and tags are refused: a sheet says everything where it stands. */
export function readYaml(file: string, text: string): ReadYaml {
  const refused = checkText(file, text);
  if (refused !== null) return { root: null, diagnostics: [refused] };
  try {
    const document = parseDocument(text, { schema: 'core', uniqueKeys: false, merge: false, logLevel: 'error' });
    const faults = yamlFaults(file, text, [...document.errors, ...document.warnings]);
    if (faults.length > 0) return { root: null, diagnostics: faults };
    return new Reader(file, text).read(document.contents);
  } catch (cause) {
    // The parser recurses; what is nested so deep that it runs out of stack is no sheet.
    if (cause instanceof RangeError) return { root: null, diagnostics: [tooDeep({ file, start: 0, end: 0 })] };
    throw cause;
  }
}

function tooDeep(span: Span): Diagnostic {
  return error('YAML_TOO_DEEP', span, TOO_DEEP);
}

class Reader {
  private readonly diagnostics: Diagnostic[] = [];
  private readonly file: string;
  private readonly text: string;
  private values = 0;

  constructor(file: string, text: string) {
    this.file = file;
    this.text = text;
  }

  read(contents: ParsedNode | null): ReadYaml {
    const root = this.entry(contents, { file: this.file, start: 0, end: 0 }, 0);
    const stops = this.diagnostics.some(({ code }) => code !== 'YAML_DUPLICATE_KEY' && code !== 'NUMBER_NOT_FINITE');
    return { root: stops ? null : root, diagnostics: this.diagnostics };
  }

  private entry(node: Node | null, place: Span, depth: number): Entry {
    const span = this.spanOf(node, place);
    const nothing: Entry = { entry: 'scalar', span, value: null, text: { text: '', span } };
    const fault = this.nodeFault(node, span, depth);
    if (fault !== null) {
      // One of a kind is enough: a bomb is made of thousands.
      if (!this.diagnostics.some(({ code }) => code === fault.code)) this.diagnostics.push(fault);
      return nothing;
    }
    if (isMap<Node, Node | null>(node)) return this.map(node.items, span, depth);
    if (isSeq<Node>(node)) {
      return { entry: 'list', span, items: node.items.map((item) => this.entry(item, span, depth + 1)) };
    }
    return isScalar(node) ? this.scalar(node, span) : nothing;
  }

  private nodeFault(node: Node | null, span: Span, depth: number): Diagnostic | null {
    this.values += 1;
    if (this.values > LIMITS.values) {
      return error('LIMIT_EXCEEDED', span, TOO_MANY, {
        hints: ['split the sheet'],
      });
    }
    if (depth > LIMITS.depth) return tooDeep(span);
    if (isAlias(node) || (node !== null && 'anchor' in node && node.anchor !== undefined)) {
      return error('YAML_ALIAS', span, 'a sheet may not use YAML anchors and aliases', {
        hints: [
          'write the value where it is used, or make it an input; put text that starts with `*` or `&` in quotes',
        ],
      });
    }
    return null;
  }

  private map(items: readonly { readonly key: Node; readonly value: Node | null }[], span: Span, depth: number): Entry {
    const seen = new Map<string, Span>();
    const pairs: EntryPair[] = [];
    for (const item of items) {
      const key = this.keyText(item.key, span, depth);
      const first = seen.get(key.text);
      if (first === undefined) {
        seen.set(key.text, key.span);
        pairs.push({ key, value: this.entry(item.value, key.span, depth + 1) });
      } else {
        const label = { span: first, text: 'it stands here first' };
        this.diagnostics.push(
          error('YAML_DUPLICATE_KEY', key.span, `the key \`${key.text}\` stands twice`, {
            labels: [label],
            hints: ['remove one of them'],
          }),
        );
      }
    }
    return { entry: 'map', span, pairs };
  }

  private keyText(key: Node, place: Span, depth: number): Text {
    const entry = this.entry(key, place, depth + 1);
    if (entry.entry === 'scalar' && entry.text.text !== '') return entry.text;
    this.diagnostics.push(
      error('YAML_SYNTAX', entry.span, 'a key must be a word', { hints: ['look for a missing key before the colon'] }),
    );
    return { text: '', span: entry.span };
  }

  private scalar(node: Scalar, span: Span): Entry {
    const value = scalarValue(node);
    const text = this.scalarText(node, span, value);
    if (isBroken(text.text)) {
      this.diagnostics.push(brokenText(text.span));
      return { entry: 'scalar', span: text.span, value: null, text: { text: '', span: text.span } };
    }
    if (typeof value === 'number' && !Number.isFinite(value)) {
      this.diagnostics.push(
        error('NUMBER_NOT_FINITE', text.span, `\`${text.text}\` is no finite number`, {
          hints: ['give a number that can be held'],
        }),
      );
    }
    return { entry: 'scalar', span: text.span, value, text };
  }

  /**
   * The scalar as the sheet writes it, so that `1.50` keeps its zero and offsets in a formula are offsets in the file. Where
   * quotes with escapes, folding or a block stand between text and file, the span covers the whole.
   */
  private scalarText(node: Scalar, span: Span, value: ScalarValue): Text {
    const raw = this.text.slice(span.start, span.end);
    if (typeof value !== 'string') return { text: value === null ? '' : raw, span };
    const inner = { ...span, start: span.start + 1, end: Math.max(span.start + 1, span.end - 1) };
    const isQuoted = node.type === 'QUOTE_SINGLE' || node.type === 'QUOTE_DOUBLE';
    if (isQuoted && raw.slice(1, -1) === value) return { text: value, span: inner };
    return { text: value, span };
  }

  private spanOf(node: Node | null, place: Span): Span {
    const range = node?.range;
    if (range === null || range === undefined) return place;
    return { file: this.file, start: Math.min(range[0], this.text.length), end: Math.min(range[1], this.text.length) };
  }
}

/** The core schema gives text, numbers, true and false, and nothing. */
function scalarValue({ value, source }: Scalar): ScalarValue {
  if (typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean') return value;
  return value === null ? null : (source ?? '');
}
