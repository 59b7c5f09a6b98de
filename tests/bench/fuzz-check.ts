import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { EvaluateRequest, Evaluation } from '../../core/evaluate/request.ts';
import { validateReport } from '../../core/report/generated/validate-report.js';
import type { LocatedDiagnostic } from '../../core/report/model.ts';

export interface Examined {
  /** What is wrong, one line each; empty where all is as it must be. */
  readonly faults: readonly string[];
  readonly ms: number;
  readonly hasReport: boolean;
}

/** Evaluates a sheet and holds the answer against what must be true of every answer, whatever the sheet says. */
export function examine(request: EvaluateRequest): Examined {
  const start = performance.now();
  let evaluation: Evaluation;
  try {
    evaluation = evaluateSheet(request);
  } catch (cause) {
    return { faults: [`throws ${thrown(cause)}`], ms: performance.now() - start, hasReport: false };
  }
  const ms = performance.now() - start;
  const { report, diagnostics } = evaluation;
  const faults = diagnostics.flatMap((diagnostic) => faultsOfDiagnostic(diagnostic, request));
  const hasError = diagnostics.some(({ severity }) => severity === 'error');
  if (hasError !== (report === null)) faults.push(hasError ? 'a report beside an error' : 'no report, and no error');
  if (report !== null) faults.push(...unfit(report, 'report'), ...schemaFaults(report));
  return { faults, ms, hasReport: report !== null };
}

function thrown(cause: unknown): string {
  if (!(cause instanceof Error)) return String(cause);
  const frame = cause.stack?.split('\n').find((line) => /^\s+at /.test(line)) ?? '';
  return `${cause.name}: ${cause.message.slice(0, 300)} ${frame.trim().replace(/\(?file:.*\/|\(?\/.*\//, '(')}`;
}

function faultsOfDiagnostic(diagnostic: LocatedDiagnostic, request: EvaluateRequest): string[] {
  const { code, message, hints, labels, column, length, excerpt, excerptColumn = 1 } = diagnostic;
  const faults: string[] = [];
  const say = (what: string): number => faults.push(`${code}: ${what}`);
  const words = [message, ...hints, ...labels.map(({ text }) => text)];
  if (words.some((text) => text.trim() === '')) say('an empty message, hint or label');
  const leak = words
    .map((text) => /\bundefined\b|\[object |\[native code\]/.exec(text)?.[0])
    .find((one) => one !== undefined);
  if (leak !== undefined && !request.files.some(({ text }) => text.includes(leak)))
    say(`words of the machine: ${leak}`);
  for (const place of [diagnostic, ...labels]) {
    if (!isInside(place, request)) say(`the place ${place.line}:${place.column} is not in its file`);
  }
  const text = lineOf(diagnostic, request);
  if (text === undefined) return faults;
  if (!Number.isInteger(length) || length < 1) say(`a length of ${length}`);
  if (length > 1 && column - 1 + length > text.length) say('more is underlined than the line holds');
  if (text.slice(excerptColumn - 1, excerptColumn - 1 + excerpt.length) !== excerpt)
    say('the excerpt is not of its line');
  if (excerptColumn === 1 && excerpt.length < Math.min(text.length, 200)) say('the excerpt is cut without need');
  if (column < excerptColumn || column > excerptColumn + excerpt.length) say('the place is not in the excerpt');
  return faults;
}

interface Place {
  readonly file: string;
  readonly line: number;
  readonly column: number;
}

function isInside(place: Place, request: EvaluateRequest): boolean {
  const line = lineOf(place, request);
  // One past the last character is where a missing thing would stand; a carriage return is part of the line's end.
  return line !== undefined && Number.isInteger(place.column) && place.column >= 1 && place.column <= line.length + 2;
}

/** The line of a place without its end. A value given from outside is a file of its own, whose name ends in its own. */
function lineOf({ file, line }: Place, request: EvaluateRequest): string | undefined {
  const given = request.overrides?.find(({ name }) => file === `--set ${name}`)?.value;
  const text = given ?? request.files.find(({ name }) => name === file)?.text;
  return text
    ?.replace(/^\uFEFF/, '')
    .split('\n')
    [line - 1]?.replace(/\r$/, '');
}

/** Where a value of the report would be lost or changed by JSON. */
function unfit(value: unknown, path: string): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (Array.isArray(value)) {
    const at = value.findIndex((item) => unfit(item, '').length > 0);
    return at < 0 ? [] : unfit(value[at], `${path}[]`);
  }
  if (typeof value === 'object' && value !== null) {
    return Object.entries(value).flatMap(([key, item]) => unfit(item, `${path}.${key}`));
  }
  return ['string', 'boolean', 'undefined'].includes(typeof value) || value === null ? [] : [`${path} is no JSON`];
}

function schemaFaults(report: unknown): string[] {
  if (validateReport(report)) return [];
  const errors = validateReport.errors ?? [];
  // A block that fits no kind is held against every kind; what is said of its values tells most.
  const telling = errors.filter(({ keyword }) => TELLING.has(keyword));
  return [...telling, ...errors]
    .slice(0, 2)
    .map(({ instancePath, message }) => `the report breaks its schema at ${instancePath}: ${message ?? ''}`);
}

const TELLING: ReadonlySet<string> = new Set(['pattern', 'type', 'minimum', 'minLength']);
