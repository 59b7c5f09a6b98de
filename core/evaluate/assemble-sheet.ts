import type { AxisTable } from '../axes/axis.ts';
import { LIBRARY } from '../library/catalogue.ts';
import type {
  EvaluatedCheck,
  EvaluatedColumn,
  EvaluatedFigure,
  EvaluatedLookup,
  EvaluatedSheet,
  EvaluatedStep,
  EvaluatedTake,
  Value,
} from '../report/evaluated-sheet.ts';
import type { CheckNode, FigureNode, SheetDocument } from '../sheet/document.ts';
import { displayUnitFor, inSystem } from '../units/display.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Site } from '../units/site.ts';
import { unitOfAmplitude } from '../units/parse-unit.ts';
import type { Unit } from '../units/unit.ts';
import type { TypedSheet } from './check-types.ts';
import type { Computed } from './compute.ts';
import type { ReadFormulas } from './read-formulas.ts';
import type { Gases } from './read-gases.ts';
import type { Inputs, TypedValue } from './read-values.ts';

/** The results of all phases. */
export interface Parts {
  readonly document: SheetDocument;
  readonly units: 'us' | 'si';
  /** Set when results are to be shown in another system than the sheet's own. */
  readonly shownIn: 'us' | 'si' | undefined;
  readonly atmosphere: TypedValue | undefined;
  readonly site: Site;
  readonly axes: AxisTable;
  readonly inputs: Inputs;
  readonly columns: readonly EvaluatedColumn[];
  readonly taken: ReadonlyMap<string, EvaluatedTake>;
  readonly lookups: readonly EvaluatedLookup[];
  readonly gases: Gases;
  readonly formulas: ReadFormulas;
  readonly typed: TypedSheet;
  readonly computed: Computed;
  readonly expectations: ReadonlyMap<string, boolean>;
}

/** Puts the results of all phases together, each value with the unit in which it is shown. */
export function assembleSheet(parts: Parts): EvaluatedSheet {
  return {
    document: parts.document,
    units: parts.units,
    atmosphere: parts.atmosphere ?? null,
    site: parts.site,
    axes: parts.axes,
    gases: [...parts.gases.gases.values()],
    inputs: parts.inputs.inputs,
    columns: parts.columns,
    taken: parts.taken,
    lookups: parts.lookups,
    steps: assembleSteps(parts),
    figures: assembleFigures(parts),
    checks: assembleChecks(parts),
    expectations: parts.expectations,
    functions: LIBRARY,
  };
}

function assembleSteps(parts: Parts): Map<string, EvaluatedStep> {
  const { formulas, typed, computed } = parts;
  const steps = new Map<string, EvaluatedStep>();
  for (const [name, { node, formula }] of formulas.steps) {
    const type = typed.steps.get(name)?.type;
    const column = computed.steps.get(name);
    if (type === undefined || column === undefined) throw new Error(`no value for the step ${name}`);
    steps.set(name, { node, formula, value: shown(type, column, formula.to?.unit, parts) });
  }
  return steps;
}

function assembleFigures(parts: Parts): Map<FigureNode, EvaluatedFigure> {
  const { formulas, typed, computed } = parts;
  const figures = new Map<FigureNode, EvaluatedFigure>();
  for (const [node, { of, limit }] of typed.figures) {
    const columns = computed.figures.get(node);
    const read = formulas.figures.get(node);
    if (columns === undefined || read === undefined) throw new Error('no values for a figure');
    const value = shown(of.type, columns.of, read.of.to?.unit, parts);
    const limitValue = limit &&
      columns.limit && { ...shown(limit.type, columns.limit, value.unit, parts), unit: value.unit };
    figures.set(node, {
      node,
      of: read.of.expression,
      value,
      limit: limitValue && read.limit ? { expression: read.limit.expression, value: limitValue } : null,
    });
  }
  return figures;
}

function assembleChecks({ typed, computed }: Parts): Map<CheckNode, EvaluatedCheck> {
  const checks = new Map<CheckNode, EvaluatedCheck>();
  for (const [node, { comparison }] of typed.checks) {
    const judgement = computed.checks.get(node);
    if (judgement !== undefined) checks.set(node, { node, comparison, ...judgement });
  }
  return checks;
}

function magnitudeOf({ data }: Value['column']): number {
  return data.reduce((largest, value) => Math.max(largest, Math.abs(value)), 0);
}

function shown(
  type: QuantityType,
  column: Value['column'],
  wanted: Unit | undefined,
  { units, shownIn }: Parts,
): Value {
  const bare = wanted ?? displayUnitFor(type, units, magnitudeOf(column));
  // A unit that names no amplitude must not hide one.
  const unit = type.amplitude === undefined ? bare : unitOfAmplitude(bare, type.amplitude);
  return { type, column, unit: shownIn === undefined ? unit : inSystem(unit, shownIn) };
}
