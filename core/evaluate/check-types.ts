import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { inferComparison, inferFormula } from '../expression/infer-type.ts';
import { namesIn } from '../expression/names.ts';
import type { TypedComparison, TypedFormula, TypeScope } from '../expression/type-scope.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { CheckNode, SheetDocument } from '../sheet/document.ts';
import type { QuantityType } from '../units/dimension.ts';
import { orderByDependence } from './order.ts';
import type { ReadFormulas, ReadStep } from './read-formulas.ts';

/** What is known of a sheet before its formulas are typed. */
export interface Known {
  readonly document: SheetDocument;
  readonly inputs: ReadonlyMap<string, QuantityType>;
  readonly gases: ReadonlySet<string>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly hasAtmosphere: boolean;
}

export interface TypedSheet {
  /** In an order in which each comes after all it reads; a step at fault is left out. */
  readonly steps: ReadonlyMap<string, TypedFormula>;
  readonly checks: ReadonlyMap<CheckNode, TypedComparison>;
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
  for (const name of types.keys()) faulty.delete(name);
  const scope: TypeScope = { ...known, types, faulty };

  const steps = new Map<string, TypedFormula>();
  for (const name of order.names) {
    const step = formulas.steps.get(name);
    if (step === undefined) continue;
    const { value, diagnostics: found } = inferFormula(step.formula, scope);
    diagnostics.push(...found);
    if (value === undefined) continue;
    steps.set(name, value);
    types.set(name, value.type);
    faulty.delete(name);
  }
  const checks = checkComparisons(formulas, scope, diagnostics);
  return { steps, checks, diagnostics };
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

function readsOf(step: ReadStep): ReadonlySet<string> {
  return namesIn(step.formula.expression);
}

/** Every name that the sheet defines, well or not. */
function definedNames({ inputs, sections, unread }: SheetDocument): Set<string> {
  const steps = sections.flatMap((section) => section.steps);
  return new Set([...[...inputs, ...steps].map((node) => node.name), ...unread].map((name) => name.text));
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
