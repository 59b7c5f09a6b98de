/** A place in prose where a value stands: `{{ F }}`. */
export interface TextValue {
  readonly name: string;
  /** Offsets in the prose, braces included. */
  readonly start: number;
  readonly end: number;
}

const VALUE = /\{\{\s*([A-Za-z][A-Za-z0-9_]*)\s*\}\}/g;

/** All values that stand in a piece of prose. */
export function textValues(text: string): TextValue[] {
  return [...text.matchAll(VALUE)].map((match) => ({
    name: match[1] ?? '',
    start: match.index,
    end: match.index + match[0].length,
  }));
}
