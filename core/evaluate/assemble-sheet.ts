import { LIBRARY } from '../library/catalogue.ts';
import type { EvaluatedCheck, EvaluatedSheet, EvaluatedStep } from '../report/evaluated-sheet.ts';
import type { CheckNode, SheetDocument } from '../sheet/document.ts';
import { displayUnit, inSystem } from '../units/display.ts';
import type { Site } from '../units/site.ts';
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
  readonly inputs: Inputs;
  readonly gases: Gases;
  readonly formulas: ReadFormulas;
  readonly typed: TypedSheet;
  readonly computed: Computed;
}

/** Puts the results of all phases together, each value with the unit in which it is shown. */
export function assembleSheet(parts: Parts): EvaluatedSheet {
  return {
    document: parts.document,
    units: parts.units,
    atmosphere: parts.atmosphere ?? null,
    site: parts.site,
    gases: [...parts.gases.gases.values()],
    inputs: parts.inputs.inputs,
    steps: assembleSteps(parts),
    checks: assembleChecks(parts),
    functions: LIBRARY,
  };
}

function assembleSteps({ formulas, typed, computed, units, shownIn }: Parts): Map<string, EvaluatedStep> {
  const steps = new Map<string, EvaluatedStep>();
  for (const [name, { node, formula }] of formulas.steps) {
    const type = typed.steps.get(name)?.type;
    const si = computed.steps.get(name);
    if (type === undefined || si === undefined) throw new Error(`no value for the step ${name}`);
    const wanted: Unit = formula.to?.unit ?? displayUnit(type, units);
    steps.set(name, {
      node,
      formula,
      value: { type, si, unit: shownIn === undefined ? wanted : inSystem(wanted, shownIn) },
    });
  }
  return steps;
}

function assembleChecks({ typed, computed }: Parts): Map<CheckNode, EvaluatedCheck> {
  const checks = new Map<CheckNode, EvaluatedCheck>();
  for (const [node, { comparison }] of typed.checks) {
    const judgement = computed.checks.get(node);
    if (judgement !== undefined) checks.set(node, { node, comparison, ...judgement });
  }
  return checks;
}
