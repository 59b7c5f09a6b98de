import { exceeds, extremes } from '../axes/column.ts';
import { cellPoint, cellText } from '../axes/points.ts';
import { functionsIn, namesIn } from '../expression/names.ts';
import { comparisonTex, expressionTex, type TexOptions } from '../expression/tex.ts';
import type { Expression } from '../expression/tree.ts';
import type { Text } from '../sheet/document.ts';
import { expectation } from './basis-drafts.ts';
import {
  annotationContent,
  annotations,
  ATMOSPHERE_PATH,
  place,
  plainText,
  type Case,
  type Draft,
  type DraftContext,
} from './draft.ts';
import type { EvaluatedCheck, EvaluatedStep } from './evaluated-sheet.ts';
import type { CheckBlock, StepBlock } from './model.ts';
import { printValue, spreadOf } from './print-value.ts';
import { fillText } from './fill-text.ts';

export function textDraft(path: string, text: Text, context: DraftContext): Draft {
  const { markdown, names } = fillText(text.text, context);
  const uses = names.flatMap((name) => context.pathOf(name) ?? []);
  return {
    block: { block: 'text', path, label: 'Text', markdown, uses, place: place(text, context) },
    content: { block: 'text', text: text.text.trim() },
    uses,
  };
}

export function stepDraft(path: string, { node, formula, value }: EvaluatedStep, context: DraftContext): Draft {
  const name = node.name.text;
  const { expression } = formula;
  const uses = usedPaths([expression], value.unit.gauge, context);
  const one = largestCase(value.column);
  return {
    block: {
      block: 'step',
      path,
      name,
      ...annotations(node, name, context),
      symbol: context.symbolOf(name),
      calc: plainText(node.calc.text),
      formula: expressionTex(expression, symbolic(context)),
      substituted: expressionTex(expression, substituted(one, context)),
      ...caseText(one, context),
      printed: printValue(value, node.digits, context),
      ...spreadOf(value, node.digits, context),
      ...expectation(node, context),
      uses,
      methods: methodsOf(expression, context),
      place: place(node.name, context),
    },
    content: {
      block: 'step',
      name,
      calc: plainText(node.calc.text),
      unit: node.unit?.text ?? null,
      expect: node.expect?.text ?? null,
      annotations: annotationContent(node, context),
    },
    uses,
  };
}

/** Of several cases, the numbers of the one with the largest magnitude are put in: it is the one that is asked about. */
function largestCase(column: EvaluatedStep['value']['column']): Case {
  const { least, greatest } = extremes(column);
  const magnitude = (cell: number): number => Math.abs(column.data[cell] ?? 0);
  return { axes: column.axes, cell: magnitude(least) > magnitude(greatest) ? least : greatest };
}

function caseText({ axes, cell }: Case, { sheet }: DraftContext): { at?: string } {
  return axes.length === 0 ? {} : { at: cellText(cell, axes, sheet.axes) };
}

export function checkDraft(path: string, check: EvaluatedCheck, context: DraftContext): Draft {
  const { node, comparison, utilisation, axes, cell, failures } = check;
  const that = plainText(node.that.text);
  const uses = usedPaths([comparison.left, comparison.right], false, context);
  return {
    block: {
      block: 'check',
      path,
      ...annotations(node, that, context),
      that,
      formula: comparisonTex(comparison, symbolic(context)),
      substituted: comparisonTex(comparison, substituted({ axes, cell }, context)),
      status: check.passes ? 'pass' : 'fail',
      utilisation,
      standing: standing(check),
      governing: cellPoint(cell, axes, context.sheet.axes),
      ...(axes.length === 0 ? {} : { axes, points: { all: check.cells, failed: failures } }),
      ...caseText({ axes, cell }, context),
      uses,
      place: place(node.that, context),
    },
    content: { block: 'check', that, annotations: annotationContent(node, context) },
    uses,
  };
}

export function symbolic({ symbolOf, sheet }: DraftContext): TexOptions {
  return { nameTex: symbolOf, functions: sheet.functions };
}

function substituted(one: Case, context: DraftContext): TexOptions {
  return { ...symbolic(context), printed: (name) => context.printedOf(name, one) };
}

/** From 0.90 on a check is close to its limit, and says so. */
const CLOSE = 0.9;

function standing({ passes, utilisation }: EvaluatedCheck): CheckBlock['standing'] {
  if (!passes) return 'over';
  return utilisation !== null && !exceeds(CLOSE, utilisation) ? 'close' : 'within';
}

/** Paths of the blocks whose values or gases an expression reads, in order of appearance. */
export function usedPaths(expressions: readonly Expression[], gauge: boolean, context: DraftContext): string[] {
  const names = expressions.flatMap((expression) => [...namesIn(expression)]);
  const paths = names.flatMap((name) => context.pathOf(name) ?? []);
  return [...new Set(gauge ? [...paths, ATMOSPHERE_PATH] : paths)];
}

/** The library functions that a formula calls; mathematics needs no source. */
function methodsOf(expression: Expression, { sheet }: DraftContext): StepBlock['methods'] {
  return [...functionsIn(expression)].flatMap((name) => {
    const method = sheet.functions.get(name);
    return method === undefined ? [] : [{ function: name, source: method.source, validity: method.validity }];
  });
}
