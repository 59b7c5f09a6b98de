import { error, type Diagnosed, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { EvaluatedInput, TypedNumber, Value } from '../report/evaluated-sheet.ts';
import type { InputNode, SheetDocument, Text } from '../sheet/document.ts';
import { toSi } from '../units/convert.ts';
import { inSystem } from '../units/display.ts';
import { parseQuantity } from '../units/parse-quantity.ts';
import type { QuantityType } from '../units/dimension.ts';
import { describeType, PRESSURE, sameDimension } from '../units/dimensions.ts';
import { NO_SITE, type Site } from '../units/site.ts';
import { article } from '../units/type-algebra.ts';
import type { Override } from './request.ts';

/** A value as typed: its number keeps its spelling as long as it is shown in the unit it was typed in. */
export type TypedValue = Value & { readonly typed: TypedNumber | null };

/** Stands as the file's name in the place of a diagnostic about a value set from outside the sheet. */
export const overrideFile = (name: string): string => `--set ${name}`;

/** The atmosphere turns gauge readings into absolute ones, so it must itself be an absolute pressure. */
export function readAtmosphere(document: SheetDocument, units: 'us' | 'si' | undefined): Diagnosed<TypedValue> {
  const text = document.atmosphere;
  if (text === undefined) return { diagnostics: [] };
  const read = readValue(text, NO_SITE, units);
  if (read.value === undefined) return read;
  const { type, si, unit } = read.value;
  if (!sameDimension(type.dimension, PRESSURE) || type.kind !== 'level' || unit.gauge) {
    return {
      diagnostics: [
        error('LEVEL_WANTED', text.span, 'the atmosphere must be an absolute pressure', {
          hints: ['write `14.696 psia` or `1.01325 bara`'],
        }),
      ],
    };
  }
  return si > 0 ? read : { diagnostics: [error('DOMAIN', text.span, 'the atmosphere must be above zero')] };
}

export interface Inputs {
  readonly inputs: ReadonlyMap<string, EvaluatedInput>;
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads every input, or the value that stands in its place from outside. */
export function readInputs(
  document: SheetDocument,
  overrides: readonly Override[],
  site: Site,
  units: 'us' | 'si' | undefined,
): Inputs {
  const set = new Map(overrides.map(({ name, value }) => [name, value]));
  const diagnostics: Diagnostic[] = [...unknownOverrides(document, overrides)];
  const inputs = new Map<string, EvaluatedInput>();
  for (const node of document.inputs) {
    const override = set.get(node.name.text);
    const written = override === undefined ? node : { ...node, value: overrideText(node.name.text, override) };
    const read = readValue(written.value, site, units);
    const misfit = override === undefined ? [] : overrideMisfit(node, written.value, read.value);
    diagnostics.push(...read.diagnostics, ...misfit);
    // A misfit is left out, or every formula that uses it would be reported as well.
    if (read.value !== undefined && misfit.length === 0)
      inputs.set(node.name.text, evaluatedInput(written, read.value));
  }
  return { inputs, diagnostics };
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
function isSameKind(a: QuantityType, b: QuantityType): boolean {
  return sameDimension(a.dimension, b.dimension) && (a.kind === b.kind || a.kind === 'open' || b.kind === 'open');
}

function evaluatedInput(node: InputNode, { typed, ...value }: TypedValue): EvaluatedInput {
  return { node, value, typed };
}

function readValue(text: Text, site: Site, units: 'us' | 'si' | undefined): Diagnosed<TypedValue> {
  const { value: read, diagnostics } = parseQuantity(text.text, text.span);
  if (read === undefined) return { diagnostics };
  if (read.unit.gauge && site.atmosphere === undefined) {
    return { diagnostics: [...diagnostics, missingAtmosphere(text.span, read.unit.text)] };
  }
  const si = toSi(read.number, read.unit, site);
  const type = { dimension: read.unit.dimension, kind: read.unit.kind };
  const unit = units === undefined ? read.unit : inSystem(read.unit, units);
  const typed = unit.text === read.unit.text ? { number: read.number, text: read.numberText } : null;
  return { value: { type, si, unit, typed }, diagnostics };
}

function missingAtmosphere(span: Span, unit: string): Diagnostic {
  return error('ATMOSPHERE_MISSING', span, `\`${unit}\` is a gauge pressure, and the sheet states no atmosphere`, {
    hints: ['add `atmosphere: 14.696 psia` (the pressure at your site) at the top of the sheet'],
  });
}

function overrideText(name: string, value: string): Text {
  return { text: value, span: { file: overrideFile(name), start: 0, end: value.length } };
}

function unknownOverrides(document: SheetDocument, overrides: readonly Override[]): Diagnostic[] {
  const names = document.inputs.map((input) => input.name.text);
  return overrides
    .filter(({ name }) => !names.includes(name))
    .map(({ name, value }) => {
      const near = nearest(name, names);
      const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : 'only inputs of the sheet can be set';
      return error('OVERRIDE', overrideText(name, value).span, `the sheet has no input \`${name}\``, { hints: [hint] });
    });
}
