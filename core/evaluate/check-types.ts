import type { Axis, AxisName } from '../axes/axis.ts';
import type { Shape } from '../axes/shape.ts';
import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { inferComparison, inferFormula } from '../expression/infer-type.ts';
import { namesIn } from '../expression/names.ts';
import { shapeOf, type TypedComparison, type TypedFormula, type TypeScope } from '../expression/type-scope.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { CheckNode, FigureNode, SheetDocument } from '../sheet/document.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { LookupTable } from '../expression/lookup-table.ts';
import type { Site } from '../units/site.ts';
import { figureFaults } from './figure-faults.ts';
import { orderByDependence } from './order.ts';
import type { ReadFormulas, ReadStep } from './read-formulas.ts';

/** What is known of a sheet before its formulas are typed. */
export interface Known {
  readonly document: SheetDocument;
  /** Types and axes of all that is given. */
  readonly inputs: ReadonlyMap<string, QuantityType>;
  readonly shapes: ReadonlyMap<string, Shape>;
  readonly axes: Map<AxisName, Axis>;
  readonly gases: ReadonlySet<string>;
  readonly tables: ReadonlyMap<string, LookupTable>;
  /** Names of columns of words. */
  readonly words: ReadonlySet<string>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly site: Site;
}

export interface TypedFigure {
  readonly of: TypedFormula;
  readonly limit?: TypedFormula;
}

export interface TypedSheet {
  /** In an order in which each comes after all it reads; a step at fault is left out. */
  readonly steps: ReadonlyMap<string, TypedFormula>;
  readonly checks: ReadonlyMap<CheckNode, TypedComparison>;
  readonly figures: ReadonlyMap<FigureNode, TypedFigure>;
  /** Types and axes of all names that have a value, and the names that are at fault. */
  readonly types: ReadonlyMap<string, QuantityType>;
  readonly shapes: ReadonlyMap<string, Shape>;
  readonly faulty: ReadonlySet<string>;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * Orders the steps by dependence and checks the dimensions of every formula, before anything is evaluated. A formula that
 * reads a faulty one is passed over in silence, so that each fault is reported once, where it is.
 */
export function checkTypes(formulas: ReadFormulas, known: Known): TypedSheet {
  const order = orderByDependence(new Map([...formulas.steps].map(([name, step]) => [name, readsOf(step)])));
  const diagnostics = order.circles.map((circle) => circleFault(circle, formulas.steps));
  const types = new Map(known.inputs);
  const faulty = definedNames(known.document);
  for (const name of [...types.keys(), ...known.gases, ...known.tables.keys(), ...known.words]) faulty.delete(name);
  const shapes = new Map(known.shapes);
  const scope: TypeScope = { ...known, types, shapes, faulty };

  const steps = new Map<string, TypedFormula>();
  for (const name of order.names) {
    const step = formulas.steps.get(name);
    if (step === undefined) continue;
    const { value, diagnostics: found } = inferFormula(step.formula, scope);
    diagnostics.push(...found);
    if (value === undefined) continue;
    steps.set(name, value);
    types.set(name, value.type);
    const shape = shapeOf(value.typed);
    if (shape.length > 0) shapes.set(name, shape);
    faulty.delete(name);
  }
  const checks = checkComparisons(formulas, scope, diagnostics);
  const figures = checkFigures(formulas, scope, diagnostics);
  return { steps, checks, figures, types, shapes, faulty, diagnostics };
}

function checkComparisons(
  formulas: ReadFormulas,
  scope: TypeScope,
  diagnostics: Diagnostic[],
): Map<CheckNode, TypedComparison> {
  const checks = new Map<CheckNode, TypedComparison>();
  for (const [node, comparison] of formulas.checks) {
    const { value, diagnostics: found } = inferComparison(comparison, scope);
    diagnostics.push(...found);
    if (value !== undefined) checks.set(node, value);
  }
  return checks;
}

function checkFigures(
  formulas: ReadFormulas,
  scope: TypeScope,
  diagnostics: Diagnostic[],
): Map<FigureNode, TypedFigure> {
  const figures = new Map<FigureNode, TypedFigure>();
  for (const [node, read] of formulas.figures) {
    const of = inferFormula(read.of, scope);
    const limit = read.limit && inferFormula(read.limit, scope);
    diagnostics.push(...of.diagnostics, ...(limit?.diagnostics ?? []));
    if (of.value === undefined || (limit !== undefined && limit.value === undefined)) continue;
    const figure = { of: of.value, ...(limit?.value === undefined ? {} : { limit: limit.value }) };
    const faults = figureFaults(node, figure);
    diagnostics.push(...faults);
    if (faults.length === 0) figures.set(node, figure);
  }
  return figures;
}

function readsOf(step: ReadStep): ReadonlySet<string> {
  return namesIn(step.formula.expression);
}

/** Every name that the sheet defines, well or not. */
function definedNames({ inputs, take, lookups, conditions, sections, unread }: SheetDocument): Set<string> {
  const steps = sections.flatMap((section) => section.steps);
  const columns = conditions?.columns ?? [];
  return new Set(
    [...[...inputs, ...take, ...lookups, ...columns, ...steps].map((node) => node.name), ...unread].map(
      (name) => name.text,
    ),
  );
}

function circleFault(circle: readonly string[], steps: ReadonlyMap<string, ReadStep>): Diagnostic {
  const nodes = circle.flatMap((name) => steps.get(name)?.node ?? []);
  const [first, ...others] = nodes;
  if (first === undefined) throw new Error('a circle without steps');
  const way = [...circle, circle[0]].map((name) => `\`${name}\``).join(' → ');
  const message =
    circle.length === 1
      ? `\`${first.name.text}\` is computed from itself`
      : `these steps depend on each other in a circle: ${way}`;
  return error('CIRCLE', first.name.span, message, {
    labels: others.map((node) => ({ span: node.name.span, text: `\`${node.name.text}\` is on the way` })),
    hints: ['break the circle: one of them must follow from inputs alone'],
  });
}
