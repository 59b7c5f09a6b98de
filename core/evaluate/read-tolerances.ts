import type { Column } from '../axes/column.ts';
import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { EvaluatedGas, Value } from '../report/evaluated-sheet.ts';
import type { GasNode, InputNode, SheetDocument, Text } from '../sheet/document.ts';
import { fromSi } from '../units/convert.ts';
import type { QuantityType } from '../units/dimension.ts';
import { article, describeType, isNumber, sameDimension } from '../units/dimensions.ts';
import { parseQuantity } from '../units/parse-quantity.ts';
import { printNumber } from '../units/print.ts';
import type { Site } from '../units/site.ts';

import { isSameKind, readValue } from './read-values.ts';

/** One side of what is uncertain: what stands in the place of the stated value, and what it is in print. */
export interface Variation {
  readonly printed: string;
  readonly instead: { readonly input: Column } | { readonly component: string; readonly share: number };
}

/** A value, or the share of a component, that may be off to both sides. */
export interface Uncertain {
  /** Name of the input or gas that it belongs to. */
  readonly name: string;
  /** What it is: the input's label, or the component of a gas. */
  readonly label: string;
  readonly path: string;
  readonly low: Variation;
  readonly high: Variation;
}

export interface Tolerances {
  readonly uncertain: readonly Uncertain[];
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads how far inputs and shares of gases may be off. */
export function readTolerances(
  { inputs, gases }: SheetDocument,
  values: ReadonlyMap<string, Value>,
  models: ReadonlyMap<string, EvaluatedGas>,
  site: Site,
): Tolerances {
  const uncertain: Uncertain[] = [];
  const diagnostics: Diagnostic[] = [];
  const add = (read: Diagnosed<Uncertain>): void => {
    diagnostics.push(...read.diagnostics);
    if (read.value !== undefined) uncertain.push(read.value);
  };
  for (const node of inputs) {
    const value = values.get(node.name.text);
    if (value !== undefined) for (const read of inputTolerance(node, value, site)) add(read);
  }
  for (const node of gases) {
    const model = models.get(node.name.text)?.model;
    if (model !== undefined) for (const share of node.tolerance) add(shareTolerance(node, share, model));
  }
  return { uncertain, diagnostics };
}

function inputTolerance(node: InputNode, value: Value, site: Site): Diagnosed<Uncertain>[] {
  const { tolerance, range } = node;
  if (tolerance !== undefined && range !== undefined) {
    return [fault('SCHEMA_VALUE', range[0], 'the input has a tolerance, and a range as well', ['keep one of the two'])];
  }
  if (range !== undefined) return [rangeTolerance(node, range, value, site)];
  return tolerance === undefined ? [] : [sidesTolerance(node, tolerance, value, site)];
}

const SIGN = /^\s*(?:±|\+-|\+\/-)\s*/;

/** A share in percent, or a difference: `2 %`, `± 5 psi`. */
function sidesTolerance(node: InputNode, tolerance: Text, value: Value, site: Site): Diagnosed<Uncertain> {
  const sign = SIGN.exec(tolerance.text)?.[0] ?? '';
  const text = tolerance.text.slice(sign.length);
  const { value: read, diagnostics } = parseQuantity(text, tolerance.span);
  if (read === undefined) return { diagnostics };
  const { unit, number } = read;
  if (number < 0) return fault('DOMAIN', tolerance, 'a tolerance is not below zero', []);
  // A percentage is a share of the value, of a percentage too: 2.4 % ± 10 % runs from 2.16 % to 2.64 %.
  if (unit.kind === 'percent') {
    return { value: sides(node, value, (si) => Math.abs(si) * number * unit.factor, site), diagnostics };
  }
  if (!isDifferenceOf(unit, value.type)) {
    const wanted = value.type.kind === 'level' ? 'a difference' : describeType(value.type);
    return fault(
      'UNIT_MISMATCH',
      tolerance,
      `the tolerance of ${article(describeType(value.type))} is ${wanted} or a percentage`,
      ['such as `2 %` or `± 5 psi`; temperatures differ in `delta_degC` or `delta_degF`'],
    );
  }
  return { value: sides(node, value, () => number * unit.factor, site), diagnostics };
}

/** What may be added to a value: for a level a difference, else the same again. */
function isDifferenceOf(given: QuantityType, of: QuantityType): boolean {
  if (of.kind !== 'level') return isSameKind(given, of);
  return sameDimension(given.dimension, of.dimension) && given.kind !== 'level';
}

function sides(node: InputNode, value: Value, width: (si: number) => number, site: Site): Uncertain {
  const moved = (sign: 1 | -1): Column => ({
    axes: value.column.axes,
    data: value.column.data.map((si) => si + sign * width(si)),
  });
  return uncertainInput(node, value, moved(-1), moved(1), site);
}

function rangeTolerance(node: InputNode, range: readonly [Text, Text], value: Value, site: Site): Diagnosed<Uncertain> {
  const [low, high] = range.map((text) => readValue(text, site, undefined));
  const diagnostics = [...(low?.diagnostics ?? []), ...(high?.diagnostics ?? [])];
  if (low?.value === undefined || high?.value === undefined) return { diagnostics };
  const [first, second] = [low.value, high.value];
  if (!isSameKind(first.type, value.type) || !isSameKind(second.type, value.type)) {
    return fault('UNIT_MISMATCH', range[0], `the range of ${article(describeType(value.type))} is of its own kind`, []);
  }
  const [least, greatest, stated] = [first, second, value].map(({ column }) => column.data[0] ?? Number.NaN);
  if (!(least! <= stated! && stated! <= greatest!)) {
    return fault('DOMAIN', range[0], 'the stated value does not lie in its range', ['write the smaller end first']);
  }
  return { value: uncertainInput(node, value, first.column, second.column, site), diagnostics };
}

function uncertainInput({ name, label }: InputNode, value: Value, low: Column, high: Column, site: Site): Uncertain {
  const variation = (input: Column): Variation => ({
    printed: shown(fromSi(input.data[0] ?? Number.NaN, value.unit, site), value.unit.text),
    instead: { input },
  });
  return {
    name: name.text,
    label: label?.text ?? name.text,
    path: `inputs/${name.text}`,
    low: variation(low),
    high: variation(high),
  };
}

/** The share of one component moves; the others make room in proportion. */
function shareTolerance(node: GasNode, share: GasNode['tolerance'][number], model: GasModel): Diagnosed<Uncertain> {
  const { component, amount } = share;
  const stated = node.fractions.findIndex((fraction) => fraction.component.text === component.text);
  const id = [...model.moleFractions.keys()][stated];
  const fraction = id === undefined ? undefined : model.moleFractions.get(id);
  if (id === undefined || fraction === undefined) {
    const near = nearest(
      component.text,
      node.fractions.map((known) => known.component.text),
      2,
    );
    return fault(
      'GAS_COMPONENT',
      component,
      `\`${node.name.text}\` has no component \`${component.text}\``,
      near.length > 0 ? [`did you mean \`${near.join('`, `')}\`?`] : [],
    );
  }
  const { value: read, diagnostics } = parseQuantity(amount.text.replace(SIGN, ''), amount.span);
  if (read === undefined) return { diagnostics };
  const width = read.number * read.unit.factor;
  if (!isNumber(read.unit.dimension) || width < 0)
    return fault('UNIT_MISMATCH', amount, 'a share in mole percent is wanted', ['such as `1.5 %`']);
  const [low, high] = [fraction - width, fraction + width];
  if (low < 0 || high > 1)
    return fault('DOMAIN', amount, `the share of \`${component.text}\` would leave 0 to 100 %`, []);
  const moved = (to: number): Variation => ({ printed: shown(to * 100, '%'), instead: { component: id, share: to } });
  return {
    value: {
      name: node.name.text,
      label: `${component.text} in ${node.name.text}`,
      path: `gases/${node.name.text}`,
      low: moved(low),
      high: moved(high),
    },
    diagnostics,
  };
}

function shown(number: number, unit: string): string {
  return unit === '1' ? printNumber(number) : `${printNumber(number)} ${unit}`;
}

function fault(code: Diagnostic['code'], at: Text, message: string, hints: readonly string[]): Diagnosed<Uncertain> {
  return { diagnostics: [error(code, at.span, message, { hints })] };
}
