import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { parseComparison, parseFormula } from '../expression/parse-formula.ts';
import type { Comparison, Formula } from '../expression/tree.ts';
import { unknownUnit } from '../units/unknown-unit.ts';
import type { CheckNode, FigureNode, SheetDocument, StepNode, Text } from '../sheet/document.ts';
import { parseUnit } from '../units/parse-unit.ts';

/** A step with its formula read. The unit that the engineer wants, by `to` or by `unit:`, stands in the formula. */
export interface ReadStep {
  readonly node: StepNode;
  readonly formula: Formula;
}

export interface ReadFigure {
  readonly of: Formula;
  readonly limit?: Formula;
}

export interface ReadFormulas {
  /** By name. A step whose formula cannot be read is left out. */
  readonly steps: ReadonlyMap<string, ReadStep>;
  readonly checks: ReadonlyMap<CheckNode, Comparison>;
  readonly figures: ReadonlyMap<FigureNode, ReadFigure>;
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads the formulas of all steps and checks; nothing is typed or evaluated yet. */
export function readFormulas(document: SheetDocument): ReadFormulas {
  const steps = new Map<string, ReadStep>();
  const checks = new Map<CheckNode, Comparison>();
  const figures = new Map<FigureNode, ReadFigure>();
  const diagnostics: Diagnostic[] = [];
  for (const section of document.sections) {
    for (const node of section.steps) {
      const read = readStep(node);
      diagnostics.push(...read.diagnostics);
      if (read.step !== null) steps.set(node.name.text, read.step);
    }
    for (const node of section.checks) {
      const { value, diagnostics: found } = parseComparison(node.that.text, node.that.span);
      diagnostics.push(...found);
      if (value !== undefined) checks.set(node, value);
    }
    for (const node of section.figures) {
      const of = readShown(node.of, node.unit);
      const limit = node.limit === undefined ? undefined : readShown(node.limit, node.unit);
      diagnostics.push(...of.diagnostics, ...(limit?.diagnostics ?? []));
      if (of.value === undefined || (limit !== undefined && limit.value === undefined)) continue;
      figures.set(node, { of: of.value, ...(limit?.value === undefined ? {} : { limit: limit.value }) });
    }
  }
  return { steps, checks, figures, diagnostics };
}

function readStep(node: StepNode): { step: ReadStep | null; diagnostics: readonly Diagnostic[] } {
  const { value: formula, diagnostics } = readShown(node.calc, node.unit);
  return { step: formula === undefined ? null : { node, formula }, diagnostics };
}

/** A formula, with the unit that stands beside it as if it stood behind `to`. */
function readShown(text: Text, unit: Text | undefined): Diagnosed<Formula> {
  const { value: formula, diagnostics } = parseFormula(text.text, text.span);
  const wanted = unit === undefined ? undefined : readUnit(unit, formula);
  const all = [...diagnostics, ...(wanted?.diagnostics ?? [])];
  if (formula === undefined) return { diagnostics: all };
  return { value: wanted?.value === undefined ? formula : { ...formula, to: wanted.value }, diagnostics: all };
}

function readUnit({ text, span }: Text, formula: Formula | undefined): Diagnosed<NonNullable<Formula['to']>> {
  const unit = parseUnit(text);
  if (unit === null) return { diagnostics: [unknownUnit(text, span)] };
  const inFormula = formula?.to?.unit.text;
  if (inFormula !== undefined && inFormula !== unit.text) {
    const message = `the result is wanted both in \`${unit.text}\` and in \`${inFormula}\``;
    return {
      diagnostics: [error('SCHEMA_VALUE', span, message, { hints: ['keep one: `unit:`, or `to` in the formula'] })],
    };
  }
  return { value: { unit, span }, diagnostics: [] };
}
