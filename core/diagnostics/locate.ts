import type { Diagnostic, Span } from './diagnostic.ts';
import type { LocatedDiagnostic } from './located-diagnostic.ts';

/** A place as people and editors count it: from 1, columns in UTF-16 units, a byte-order mark not counted. */
export interface Place {
  readonly line: number;
  readonly column: number;
}

type TextOf = (file: string) => string | undefined;

const BYTE_ORDER_MARK = '\uFEFF';
/** A line longer than this is cut around the fault, so that a report stays small whatever the sheet holds. */
const LONGEST_EXCERPT = 400;

/** Line and column of an offset. An offset outside the text gives the nearest place inside it. */
export function locate(text: string, offset: number): Place {
  return placeIn(text, lineStarts(text), offset);
}

/** Line of a place, for many places: each file's lines are counted once. */
export function lineFinder(textOf: TextOf): (at: Span) => number {
  const files = fileCache(textOf);
  return ({ file, start }) => {
    const { text, starts } = files(file);
    return placeIn(text, starts, start).line;
  };
}

/** A diagnostic with its place as file, line and column. The place is 1:1 where the file's text is not known. */
export function locateDiagnostic(diagnostic: Diagnostic, textOf: TextOf): LocatedDiagnostic {
  return locateWith(diagnostic, fileCache(textOf));
}

/** As `locateDiagnostic`, for many: each file's lines are counted once. */
export function locateDiagnostics(diagnostics: readonly Diagnostic[], textOf: TextOf): LocatedDiagnostic[] {
  const files = fileCache(textOf);
  return diagnostics.map((diagnostic) => locateWith(diagnostic, files));
}

interface Lines {
  readonly text: string;
  readonly starts: readonly number[];
}

function fileCache(textOf: TextOf): (file: string) => Lines {
  const cache = new Map<string, Lines>();
  return (file) => {
    const known = cache.get(file);
    if (known) return known;
    const text = textOf(file) ?? '';
    const lines = { text, starts: lineStarts(text) };
    cache.set(file, lines);
    return lines;
  };
}

function locateWith(diagnostic: Diagnostic, linesOf: (file: string) => Lines): LocatedDiagnostic {
  const { span } = diagnostic;
  const lines = linesOf(span.file);
  const place = placeIn(lines.text, lines.starts, span.start);
  return {
    code: diagnostic.code,
    severity: diagnostic.severity,
    message: diagnostic.message,
    file: span.file,
    ...place,
    ...excerptOf(lines, span, place),
    hints: diagnostic.hints,
    labels: diagnostic.labels.map((label) => {
      const { text, starts } = linesOf(label.span.file);
      return { file: label.span.file, ...placeIn(text, starts, label.span.start), text: label.text };
    }),
  };
}

/** The line of the fault, and how much of it is underlined; what lies on further lines is left out. */
function excerptOf(
  { text, starts }: Lines,
  span: Span,
  place: Place,
): Pick<LocatedDiagnostic, 'excerpt' | 'excerptColumn' | 'length'> {
  const start = (starts[place.line - 1] ?? 0) + (place.line === 1 && text.startsWith(BYTE_ORDER_MARK) ? 1 : 0);
  const next = starts[place.line];
  const line = text.slice(start, next === undefined ? text.length : next - 1).replace(/\r$/, '');
  const spanLength = Math.min(span.end - span.start, line.length - (place.column - 1));
  const length = Math.max(1, Math.min(spanLength, LONGEST_EXCERPT / 2));
  if (line.length <= LONGEST_EXCERPT) return { excerpt: line, length };
  const wanted = Math.max(0, Math.min(place.column - 1 - LONGEST_EXCERPT / 4, line.length - LONGEST_EXCERPT));
  const from = wholeCharacter(line, wanted);
  const excerpt = line.slice(from, wholeCharacter(line, from + LONGEST_EXCERPT));
  return { excerpt, excerptColumn: from + 1, length };
}

/** The offset itself, or one before it where it falls between the two halves of a character. */
function wholeCharacter(line: string, offset: number): number {
  return /[\uDC00-\uDFFF]/.test(line.charAt(offset)) && offset > 0 ? offset - 1 : offset;
}

function lineStarts(text: string): number[] {
  const starts = [0];
  for (let at = text.indexOf('\n'); at !== -1; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return starts;
}

function placeIn(text: string, starts: readonly number[], offset: number): Place {
  const inside = Math.max(0, Math.min(offset, text.length));
  let low = 0;
  let high = starts.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((starts[middle] ?? 0) <= inside) low = middle;
    else high = middle - 1;
  }
  const hidden = low === 0 && text.startsWith(BYTE_ORDER_MARK) ? 1 : 0;
  const start = (starts[low] ?? 0) + hidden;
  // A place on the line end itself stands just behind the line's last character.
  const next = starts[low + 1];
  const end = next === undefined ? text.length : next - (text.charAt(next - 2) === '\r' ? 2 : 1);
  return { line: low + 1, column: Math.max(0, Math.min(inside, end) - start) + 1 };
}
