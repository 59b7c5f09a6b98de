import { functionsIn, namesIn } from '../expression/names.ts';
import { comparisonTex, expressionTex, type TexOptions } from '../expression/tex.ts';
import type { Expression } from '../expression/tree.ts';
import type { Text } from '../sheet/document.ts';
import { printQuantity } from '../units/print.ts';
import { printOptions } from './basis-drafts.ts';
import {
  annotationContent,
  annotations,
  ATMOSPHERE_PATH,
  place,
  plainText,
  type Draft,
  type DraftContext,
} from './draft.ts';
import type { EvaluatedCheck, EvaluatedStep } from './evaluated-sheet.ts';
import type { CheckBlock, StepBlock } from './model.ts';

export function textDraft(path: string, text: Text, context: DraftContext): Draft {
  return {
    block: { block: 'text', path, label: 'Text', markdown: text.text, place: place(text, context) },
    content: { block: 'text', text: text.text.trim() },
    uses: [],
  };
}

export function stepDraft(path: string, { node, formula, value }: EvaluatedStep, context: DraftContext): Draft {
  const name = node.name.text;
  const { expression } = formula;
  const uses = usedPaths([expression], value.unit.gauge, context);
  return {
    block: {
      block: 'step',
      path,
      name,
      ...annotations(node, name, context),
      symbol: context.symbolOf(name),
      calc: plainText(node.calc.text),
      formula: expressionTex(expression, symbolic(context)),
      substituted: expressionTex(expression, substituted(context)),
      printed: printQuantity(value.si, value.unit, printOptions(node.digits, context)),
      uses,
      methods: methodsOf(expression, context),
      place: place(node.name, context),
    },
    content: {
      block: 'step',
      name,
      calc: plainText(node.calc.text),
      unit: node.unit?.text ?? null,
      annotations: annotationContent(node, context),
    },
    uses,
  };
}

export function checkDraft(path: string, check: EvaluatedCheck, context: DraftContext): Draft {
  const { node, comparison, utilisation } = check;
  const that = plainText(node.that.text);
  const uses = usedPaths([comparison.left, comparison.right], false, context);
  return {
    block: {
      block: 'check',
      path,
      ...annotations(node, that, context),
      that,
      formula: comparisonTex(comparison, symbolic(context)),
      substituted: comparisonTex(comparison, substituted(context)),
      status: check.passes ? 'pass' : 'fail',
      utilisation,
      standing: standing(check),
      uses,
      place: place(node.that, context),
    },
    content: { block: 'check', that, annotations: annotationContent(node, context) },
    uses,
  };
}

function symbolic({ symbolOf, sheet }: DraftContext): TexOptions {
  return { nameTex: symbolOf, functions: sheet.functions };
}

function substituted(context: DraftContext): TexOptions {
  return { ...symbolic(context), printed: context.printedOf };
}

/** From 0.90 on a check is close to its limit, and says so. */
const CLOSE = 0.9;

function standing({ passes, utilisation }: EvaluatedCheck): CheckBlock['standing'] {
  if (!passes) return 'over';
  return utilisation !== null && utilisation >= CLOSE ? 'close' : 'within';
}

/** Paths of the blocks whose values or gases an expression reads, in order of appearance. */
function usedPaths(expressions: readonly Expression[], gauge: boolean, context: DraftContext): string[] {
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
