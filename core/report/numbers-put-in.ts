import { scanTokens } from '../expression/scan-tokens.ts';
import type { Token } from '../expression/token.ts';
import { absoluteUnit } from '../units/display.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { printQuantity, printSpread } from '../units/print.ts';
import type { Printed } from '../units/printed.ts';
import { ownQuantity } from './compare-reports.ts';
import type { Quantity, Report } from './model.ts';
import { rangeOf, readPoint, siAt, type ReportPoint } from './report-points.ts';

/** A formula of the report, and the case whose numbers are put in, as its block names it. */
export interface WrittenFormula {
  readonly text: string;
  readonly axes?: readonly string[];
  readonly at?: string;
}

/**
 * A formula as the sheet writes it, with values in the place of their names: `2.4 % * 918.9 psia * 26.07 in^2`. Gases,
 * tables and constants keep their names; a gauge reading stands as the absolute pressure that formulas compute with.
 */
export function numbersPutIn({ text, axes = [], at = '' }: WrittenFormula, report: Report): string {
  const { tokens, to } = scanTokens({ text, span: { file: '', start: 0, end: text.length } });
  const point =
    readPoint(
      at,
      report.axes.filter(({ name }) => axes.includes(name)),
    ) ?? NOWHERE;
  let [written, end] = ['', 0];
  tokens.forEach((token, i) => {
    // A superscript is two tokens in one place.
    if (token.start < end) return;
    written +=
      text.slice(end, token.start) +
      partText(token, text, { before: tokens[i - 1], after: tokens[i + 1] }, report, point);
    end = token.end;
  });
  return (written + text.slice(end, to?.start)).replace(/ {2,}/g, ' ').trim();
}

const NOWHERE: ReportPoint = new Map();

interface Neighbours {
  readonly before: Token | undefined;
  readonly after: Token | undefined;
}

function partText(token: Token, text: string, beside: Neighbours, report: Report, point: ReportPoint): string {
  const source = text.slice(token.start, token.end);
  if (token.kind === 'operator') return isSpaced(token.text, beside) ? ` ${source} ` : source;
  const quantity = token.kind === 'name' ? ownQuantity(report, token.text) : undefined;
  return quantity === undefined ? source : bracketed(valueAt(quantity, point), beside);
}

/** Between values with units, signs of sums and products need room; a sign of a single value stays with it. */
function isSpaced(operator: string, { before }: Neighbours): boolean {
  const isUnary = before === undefined || ['operator', 'open', 'comma', 'comparison'].includes(before.kind);
  return !isUnary && ['*', '+', '-'].includes(operator);
}

/** Powers and fractions would read as those of the unit, and a second sign as a slip. */
function bracketed({ number, unit }: Printed, { before, after }: Neighbours): string {
  const value = unit === '' ? number : `${number} ${unit}`;
  const [left, right] = [operatorOf(before), operatorOf(after)];
  const isSeveral = number.includes('…') && (left ?? right) !== undefined;
  const isDivided = value.includes(' ') && (left === '/' || right === '/');
  const isNegative = number.startsWith('-') && (left !== undefined || right === '^');
  const isRaised = value.includes(' ') && (right === '^' || left === '^');
  return isSeveral || isDivided || isNegative || isRaised ? `(${value})` : value;
}

function operatorOf(token: Token | undefined): string | undefined {
  return token?.kind === 'operator' ? token.text : undefined;
}

function valueAt(quantity: Quantity, point: ReportPoint): Printed {
  const unit = parseUnit(quantity.unit);
  if (unit === null) throw new Error(`the report has an unknown unit: ${quantity.unit}`);
  if (quantity.axes.length === 0 && !unit.gauge) return quantity.printed;
  const shown = absoluteUnit(unit);
  const si = siAt(quantity, point);
  if (si !== undefined) return printQuantity(si, shown);
  const { least, greatest } = rangeOf(quantity.si);
  return printSpread(least, greatest, shown);
}
