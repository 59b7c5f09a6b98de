import { displayWidth, visible } from './display-text.ts';
import type { LocatedDiagnostic } from './located-diagnostic.ts';

/** How the parts of a diagnostic are coloured; the host supplies it, plain text without it. */
export interface Paint {
  readonly error: (text: string) => string;
  readonly warning: (text: string) => string;
  readonly info: (text: string) => string;
  readonly dim: (text: string) => string;
}

const PLAIN: Paint = { error: (text) => text, warning: (text) => text, info: (text) => text, dim: (text) => text };

/** Columns that the source line may take; a longer line is cut around the fault. */
const WIDEST_LINE = 100;
/** Columns kept before the fault when the line is cut. */
const LEAD = 40;
const CUT = '…';

/**
 * A diagnostic as people read it:
 *
 *     error[UNIT_UNKNOWN]: unknown unit `psgi`
 *       --> sheet.yaml:14:12
 *        |
 *     14 |   p_d: 905 psgi
 *        |            ^^^^
 *        = hint: did you mean `psig`?
 */
export function renderDiagnostic(diagnostic: LocatedDiagnostic, paint: Paint = PLAIN): string {
  const gutter = ' '.repeat(String(diagnostic.line).length);
  const head = `${diagnostic.severity}[${diagnostic.code}]`;
  return [
    `${paint[diagnostic.severity](head)}: ${visible(diagnostic.message)}`,
    `${paint.dim(`${gutter}-->`)} ${visible(placeOf(diagnostic))}`,
    ...snippet(diagnostic, gutter, paint),
    ...diagnostic.labels.map((label) => note(gutter, paint, `see ${placeOf(label)}: ${label.text}`)),
    ...diagnostic.hints.map((hint) => note(gutter, paint, `hint: ${hint}`)),
  ].join('\n');
}

/** One line for tools: `file:line:col: error[CODE]: message`. */
export function shortForm(diagnostic: LocatedDiagnostic): string {
  const { severity, code, message } = diagnostic;
  return visible(`${placeOf(diagnostic)}: ${severity}[${code}]: ${message}`);
}

function placeOf({ file, line, column }: { file: string; line: number; column: number }): string {
  return `${file}:${line}:${column}`;
}

function note(gutter: string, paint: Paint, text: string): string {
  return `${paint.dim(`${gutter} =`)} ${visible(text)}`;
}

/** The source line with carets below; nothing where there is no source to show. */
function snippet(diagnostic: LocatedDiagnostic, gutter: string, paint: Paint): string[] {
  if (diagnostic.excerpt.trim() === '') return [];
  const { before, marked, after } = cutLine(diagnostic);
  const carets = '^'.repeat(Math.max(1, displayWidth(marked)));
  return [
    paint.dim(`${gutter} |`),
    `${paint.dim(`${diagnostic.line} |`)} ${before}${marked}${after}`.trimEnd(),
    `${paint.dim(`${gutter} |`)} ${' '.repeat(displayWidth(before))}${paint[diagnostic.severity](carets)}`,
  ];
}

interface CutLine {
  readonly before: string;
  readonly marked: string;
  readonly after: string;
}

/** The line in three parts, made visible, and cut on both sides where it is too wide. */
function cutLine(diagnostic: LocatedDiagnostic): CutLine {
  const { excerpt, column, length, excerptColumn = 1 } = diagnostic;
  const start = column - excerptColumn;
  const before = visible(excerpt.slice(0, start));
  const marked = visible(excerpt.slice(start, start + length));
  const after = visible(excerpt.slice(start + length));
  if (displayWidth(before + marked + after) <= WIDEST_LINE) return { before, marked, after };

  const lead = displayWidth(before) > LEAD ? CUT + keepEnd(before, LEAD - 1) : before;
  const body = keepStart(marked, WIDEST_LINE - displayWidth(lead) - 1);
  if (body !== marked) return { before: lead, marked: body, after: CUT };
  const rest = keepStart(after, WIDEST_LINE - displayWidth(lead + body) - 1);
  return { before: lead, marked: body, after: rest === after ? after : rest + CUT };
}

function keepStart(text: string, width: number): string {
  let kept = '';
  let used = 0;
  for (const character of text) {
    used += displayWidth(character);
    if (used > width) break;
    kept += character;
  }
  return kept;
}

function keepEnd(text: string, width: number): string {
  const characters = [...text];
  let first = characters.length;
  let used = 0;
  while (first > 0) {
    used += displayWidth(characters[first - 1] ?? '');
    if (used > width) break;
    first -= 1;
  }
  return characters.slice(first).join('');
}
