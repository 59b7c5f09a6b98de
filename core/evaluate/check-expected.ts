import { exceeds, extremes, type Column } from '../axes/column.ts';
import { cellText } from '../axes/points.ts';
import type { AxisTable } from '../axes/axis.ts';
import { error, warning, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { SheetDocument, Text } from '../sheet/document.ts';
import { fromSi, toSi } from '../units/convert.ts';
import type { QuantityType } from '../units/dimension.ts';
import { article, describeType, sameDimension } from '../units/dimensions.ts';
import { parseRange } from '../units/parse-range.ts';
import { printNumber } from '../units/print.ts';
import { missingFromSite, type Site } from '../units/site.ts';

import type { Unit } from '../units/unit.ts';
import { isSameKind } from './read-values.ts';

/** A range in which an engineer would believe a value, in SI. */
interface Expected {
  readonly name: string;
  readonly text: Text;
  readonly least: number;
  readonly greatest: number;
  readonly unit: Unit;
}

export interface Expectations {
  readonly expected: readonly Expected[];
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads the expected ranges of inputs and steps; each must be of the kind of what it stands beside. */
export function readExpected(
  { inputs, sections }: SheetDocument,
  types: ReadonlyMap<string, QuantityType>,
  site: Site,
): Expectations {
  const diagnostics: Diagnostic[] = [];
  const expected: Expected[] = [];
  for (const { name, expect } of [...inputs, ...sections.flatMap(({ steps }) => steps)]) {
    const type = types.get(name.text);
    if (expect === undefined || type === undefined) continue;
    const { value: range, diagnostics: found } = parseRange(expect.text, expect.span);
    diagnostics.push(...found);
    if (range === undefined) continue;
    const { unit, from, to } = range;
    const fits = isSameKind(unit, type) || (sameDimension(unit.dimension, type.dimension) && unit.kind === 'plain');
    if (!fits) {
      diagnostics.push(
        error('UNIT_MISMATCH', expect.span, `${article(describeType(type))} is expected in \`${unit.text}\``, {
          hints: ['give the range in a unit of the value'],
        }),
      );
    } else if (missingFromSite(unit, site) === null) {
      expected.push({
        name: name.text,
        text: expect,
        unit,
        least: toSi(from, unit, site),
        greatest: toSi(to, unit, site),
      });
    }
  }
  return { expected, diagnostics };
}

/** Holds the values against their expected ranges: outside of one, a reader should ask why. */
export function checkExpected(
  expected: readonly Expected[],
  columns: ReadonlyMap<string, Column>,
  axes: AxisTable,
  site: Site,
): { readonly within: ReadonlyMap<string, boolean>; readonly diagnostics: readonly Diagnostic[] } {
  const within = new Map<string, boolean>();
  const diagnostics: Diagnostic[] = [];
  for (const { name, text, least, greatest, unit } of expected) {
    const column = columns.get(name);
    if (column === undefined) continue;
    const ends = extremes(column);
    const [low, high] = [column.data[ends.least] ?? Number.NaN, column.data[ends.greatest] ?? Number.NaN];
    const outside = exceeds(least, low) ? ends.least : exceeds(high, greatest) ? ends.greatest : null;
    within.set(name, outside === null);
    if (outside === null) continue;
    const where = cellText(outside, column.axes, axes);
    const value = printNumber(fromSi(column.data[outside] ?? Number.NaN, unit, site));
    const message = `\`${name}\` is ${value}${unit.text === '1' ? '' : ` ${unit.text}`}${where === '' ? '' : ` at ${where}`}, outside of what is expected: ${text.text.trim()}`;
    diagnostics.push(
      warning('UNEXPECTED', text.span, message, {
        hints: ['look for a wrong unit or a slipped digit; if the value is right, say why in a note'],
      }),
    );
  }
  return { within, diagnostics };
}
