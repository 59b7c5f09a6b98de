import { axisPoints, type NumericAxis } from '../axes/axis.ts';
import { onlyValue, single } from '../axes/column.ts';
import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { EvaluatedInput, TypedNumber, Value } from '../report/evaluated-sheet.ts';
import type { InputNode, SheetDocument, Text } from '../sheet/document.ts';
import { toSi } from '../units/convert.ts';
import { inSystem } from '../units/display.ts';
import { parseQuantity } from '../units/parse-quantity.ts';
import { isRange } from '../units/parse-range.ts';
import type { QuantityType } from '../units/dimension.ts';
import { article, describeType, PRESSURE, sameDimension } from '../units/dimensions.ts';
import { missingState } from '../units/missing-state.ts';
import { missingFromSite, NO_SITE, type Site } from '../units/site.ts';
import { typeOfUnit } from '../units/unit.ts';

import type { Overrides } from './overrides.ts';
import type { Axes } from './read-axes.ts';

/** A value as typed: its number keeps its spelling as long as it is shown in the unit it was typed in. */
export type TypedValue = Value & { readonly typed: TypedNumber | null };

/** The atmosphere turns gauge readings into absolute ones, so it must itself be an absolute pressure. */
export function readAtmosphere(document: SheetDocument, units: 'us' | 'si' | undefined): Diagnosed<TypedValue> {
  const text = document.atmosphere;
  if (text === undefined) return { diagnostics: [] };
  const read = readValue(text, NO_SITE, units);
  if (read.value === undefined) return read;
  const { type, column, unit } = read.value;
  if (!sameDimension(type.dimension, PRESSURE) || type.kind !== 'level' || unit.gauge) {
    return {
      diagnostics: [
        error('LEVEL_WANTED', text.span, 'the atmosphere must be an absolute pressure', {
          hints: ['write `14.696 psia` or `1.01325 bara`'],
        }),
      ],
    };
  }
  return onlyValue(column) > 0
    ? read
    : { diagnostics: [error('DOMAIN', text.span, 'the atmosphere must be above zero')] };
}

export interface Inputs {
  readonly inputs: ReadonlyMap<string, EvaluatedInput>;
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads every input, or the value that stands in its place from outside. */
export function readInputs(
  document: SheetDocument,
  overrides: Overrides,
  { axes, ranges }: Axes,
  site: Site,
  units: 'us' | 'si' | undefined,
): Inputs {
  const diagnostics: Diagnostic[] = [...overrides.diagnostics];
  const inputs = new Map<string, EvaluatedInput>();
  for (const node of document.inputs) {
    const { text, isSet } = overrides.of(node);
    const written = { ...node, value: text };
    const axis = axes.get(ranges.get(node) ?? 'condition');
    if (isRange(node.value.text)) {
      // A range that cannot be read has been reported with the axes.
      if (ranges.has(node) && axis !== undefined && 'coordinates' in axis)
        inputs.set(node.name.text, { node: written, value: alongAxis(axis, units), typed: rangeText(axis, units) });
      continue;
    }
    const read = readValue(text, site, units);
    const misfit = isSet ? overrideMisfit(node, text, read.value) : [];
    diagnostics.push(...read.diagnostics, ...misfit);
    // A misfit is left out, or every formula that uses it would be reported as well.
    if (read.value !== undefined && misfit.length === 0)
      inputs.set(node.name.text, evaluatedInput(written, read.value));
  }
  return { inputs, diagnostics };
}

/** The values of an axis, as those of the input that lays it down. */
function alongAxis({ name, coordinates, type, unit }: NumericAxis, units: 'us' | 'si' | undefined): Value {
  const column = { axes: [name], data: coordinates };
  return { type, column, unit: units === undefined ? unit : inSystem(unit, units) };
}

/** Both ends as they were typed, as long as they are shown in the unit of the range. */
function rangeText(axis: NumericAxis, units: 'us' | 'si' | undefined): TypedNumber | null {
  if (units !== undefined && inSystem(axis.unit, units).text !== axis.unit.text) return null;
  const points = axisPoints(axis);
  const [first, last] = [points[0], points.at(-1)];
  return { number: Number(first), text: first === last ? String(first) : `${first} … ${last}` };
}

/** The formulas were written for the value in the sheet, so what stands in its place must be of the same kind. */
function overrideMisfit(node: InputNode, override: Text, set: TypedValue | undefined): Diagnostic[] {
  const inSheet = parseQuantity(node.value.text, node.value.span).value?.unit;
  if (inSheet === undefined || set === undefined || isSameKind(inSheet, set.type)) return [];
  const message = `\`${node.name.text}\` is ${article(describeType(inSheet))}, and ${article(describeType(set.type))} is given`;
  const label = { span: node.value.span, text: `the sheet has \`${node.value.text}\`` };
  return [error('OVERRIDE', override.span, message, { labels: [label] })];
}

/** K and degR may stand for a level as well as for a difference. */
export function isSameKind(a: QuantityType, b: QuantityType): boolean {
  if (a.amplitude !== undefined && b.amplitude !== undefined && a.amplitude !== b.amplitude) return false;
  return sameDimension(a.dimension, b.dimension) && (a.kind === b.kind || a.kind === 'open' || b.kind === 'open');
}

function evaluatedInput(node: InputNode, { typed, ...value }: TypedValue): EvaluatedInput {
  return { node, value, typed };
}

/** Reads one value with its unit. */
export function readValue(text: Text, site: Site, units: 'us' | 'si' | undefined): Diagnosed<TypedValue> {
  const { value: read, diagnostics } = parseQuantity(text.text, text.span);
  if (read === undefined) return { diagnostics };
  const missing = missingFromSite(read.unit, site);
  if (missing !== null) return { diagnostics: [...diagnostics, missingState(missing, read.unit, text.span)] };
  const si = toSi(read.number, read.unit, site);
  const type = typeOfUnit(read.unit);
  const unit = units === undefined ? read.unit : inSystem(read.unit, units);
  const typed = unit.text === read.unit.text ? { number: read.number, text: read.numberText } : null;
  return { value: { type, column: single(si), unit, typed }, diagnostics };
}
