import { printQuantity, printTyped, type PrintOptions } from '../units/print.ts';
import type { Printed } from '../units/printed.ts';
import type { Text } from '../sheet/document.ts';
import {
  annotationContent,
  annotations,
  ATMOSPHERE_PATH,
  place,
  plainText,
  type Draft,
  type DraftContext,
} from './draft.ts';
import type { EvaluatedGas, EvaluatedInput, TypedNumber, Value } from './evaluated-sheet.ts';

/** The atmosphere is a block of its own: every gauge reading rests on it, so a checker must be able to tick it. */
export function atmosphereDraft(text: Text, context: DraftContext): Draft[] {
  const { atmosphere } = context.sheet;
  if (atmosphere === null) return [];
  return [
    {
      block: {
        block: 'input',
        path: ATMOSPHERE_PATH,
        name: 'atmosphere',
        label: 'Atmospheric pressure',
        symbol: 'p_{\\mathrm{atm}}',
        typed: text.text,
        printed: printInput(atmosphere, atmosphere.typed, undefined, context),
        place: place(text, context),
      },
      content: { block: 'atmosphere', value: plainText(text.text) },
      uses: [],
    },
  ];
}

export function inputDraft(input: EvaluatedInput, context: DraftContext): Draft {
  const { node, value, typed } = input;
  const name = node.name.text;
  return {
    block: {
      block: 'input',
      path: `inputs/${name}`,
      name,
      ...annotations(node, name, context),
      symbol: context.symbolOf(name),
      typed: node.value.text,
      printed: printInput(value, typed, node.digits, context),
      ...(node.hold === undefined ? {} : { hold: node.hold.text }),
      place: place(node.name, context),
    },
    content: {
      block: 'input',
      name,
      value: plainText(node.value.text),
      hold: node.hold?.text ?? null,
      annotations: annotationContent(node, context),
    },
    uses: value.unit.gauge ? [ATMOSPHERE_PATH] : [],
  };
}

/** An input keeps the digits it was typed with, as long as it is shown in the unit it was typed in. */
export function printInput(
  value: Value,
  typed: TypedNumber | null,
  digits: number | undefined,
  context: DraftContext,
): Printed {
  if (typed !== null && digits === undefined) return printTyped(typed.text, value.unit);
  return printQuantity(value.si, value.unit, printOptions(digits, context));
}

export function printOptions(
  digits: number | undefined,
  context: DraftContext,
): PrintOptions {
  return { ...(digits === undefined ? {} : { digits }), site: context.sheet.site };
}

export function gasDraft({ node, model }: EvaluatedGas, context: DraftContext): Draft {
  const name = node.name.text;
  const fractions = [...model.moleFractions].map(([component, fraction]) => ({
    component,
    percent: percent(fraction),
  }));
  return {
    block: {
      block: 'gas',
      path: `gases/${name}`,
      name,
      ...annotations(node, name, context),
      method: model.method,
      fractions,
      place: place(node.name, context),
    },
    content: {
      block: 'gas',
      name,
      method: model.method,
      fractions: node.fractions.map(({ component, amount }) => [component.text, plainText(amount.text)]).toSorted(),
      annotations: annotationContent(node, context),
    },
    uses: [],
  };
}

/** Mole percent to at most four decimals, without trailing zeros. */
function percent(fraction: number): string {
  return String(Number((fraction * 100).toFixed(4)));
}

export function assumptionDraft(text: Text, number: number, context: DraftContext): Draft {
  return {
    block: {
      block: 'assumption',
      path: `assumptions/${number}`,
      label: `Assumption ${number}`,
      text: text.text,
      place: place(text, context),
    },
    content: { block: 'assumption', text: plainText(text.text) },
    uses: [],
  };
}
