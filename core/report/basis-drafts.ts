import type { InputNode, StepNode, Text } from '../sheet/document.ts';
import {
  annotationContent,
  annotations,
  ATMOSPHERE_PATH,
  place,
  plainText,
  type Draft,
  type DraftContext,
} from './draft.ts';
import type { EvaluatedGas, EvaluatedInput, EvaluatedLookup, EvaluatedTake } from './evaluated-sheet.ts';
import type { Expectation, StatementBlock } from './model.ts';
import { printInput, printValue, spreadOf } from './print-value.ts';

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
      ...spreadOf(value, node.digits, context),
      ...(node.hold === undefined ? {} : { hold: node.hold.text }),
      ...optionalTexts(node),
      ...expectation(node, context),
      place: place(node.name, context),
    },
    content: {
      block: 'input',
      name,
      value: plainText(node.value.text),
      hold: node.hold?.text ?? null,
      tolerance: toleranceText(node) ?? null,
      expect: node.expect?.text ?? null,
      annotations: annotationContent(node, context),
    },
    uses: value.unit.gauge ? [ATMOSPHERE_PATH] : [],
  };
}

function optionalTexts(node: InputNode): { tolerance?: string } {
  const tolerance = toleranceText(node);
  return tolerance === undefined ? {} : { tolerance };
}

/** `± 2 %`, or `880 psig … 930 psig`. */
function toleranceText({ tolerance, range }: InputNode): string | undefined {
  if (range !== undefined) return `${range[0].text} … ${range[1].text}`;
  return tolerance === undefined ? undefined : `± ${tolerance.text.replace(/^\s*(?:±|\+-|\+\/-)\s*/, '')}`;
}

export function expectation(node: InputNode | StepNode, { sheet }: DraftContext): { expect?: Expectation } {
  const within = sheet.expectations.get(node.name.text);
  return node.expect === undefined || within === undefined
    ? {}
    : { expect: { range: plainText(node.expect.text), within } };
}

export function takenDraft({ node, value, revision }: EvaluatedTake, context: DraftContext): Draft {
  const name = node.name.text;
  return {
    block: {
      block: 'taken',
      path: `taken/${name}`,
      name,
      ...annotations(node, name, context),
      symbol: context.symbolOf(name),
      from: node.from.text,
      revision,
      printed: printValue(value, node.digits, context),
      ...spreadOf(value, node.digits, context),
      place: place(node.name, context),
    },
    content: { block: 'taken', name, from: node.from.text, revision, annotations: annotationContent(node, context) },
    uses: value.unit.gauge ? [ATMOSPHERE_PATH] : [],
  };
}

export function lookupDraft({ node }: EvaluatedLookup, context: DraftContext): Draft {
  const name = node.name.text;
  const columns = node.columns.map((column) => ({
    name: column.name.text,
    unit: column.unit.text === '1' ? '' : column.unit.text,
  }));
  const rows = node.rows.map((row) => row.map((cell) => plainText(cell.text)));
  return {
    block: {
      block: 'lookup',
      path: `tables/${name}`,
      name,
      ...annotations(node, name, context),
      symbol: context.symbolOf(name),
      columns,
      rows,
      place: place(node.name, context),
    },
    content: { block: 'lookup', name, columns, rows, annotations: annotationContent(node, context) },
    uses: [],
  };
}

export function gasDraft({ node, model }: EvaluatedGas, context: DraftContext): Draft {
  const name = node.name.text;
  const tolerances = new Map(node.tolerance.map(({ component, amount }) => [component.text, amount.text]));
  const fractions = [...model.moleFractions].map(([component, fraction]) => {
    const tolerance = tolerances.get(component);
    return {
      component,
      percent: percent(fraction),
      ...(tolerance === undefined ? {} : { tolerance: `± ${tolerance}` }),
    };
  });
  const asTyped = (shares: typeof node.fractions): unknown =>
    shares.map(({ component, amount }) => [component.text, plainText(amount.text)]).toSorted();
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
      fractions: asTyped(node.fractions),
      tolerance: asTyped(node.tolerance),
      annotations: annotationContent(node, context),
    },
    uses: [],
  };
}

/** Mole percent to at most four decimals, without trailing zeros. */
function percent(fraction: number): string {
  return String(Number((fraction * 100).toFixed(4)));
}

const WORDS: Readonly<Record<StatementBlock['block'], string>> = {
  assumption: 'Assumption',
  exclusion: 'Exclusion',
  reference: 'Reference',
};

export function statementDraft(
  kind: StatementBlock['block'],
  text: Text,
  number: number,
  context: DraftContext,
): Draft {
  return {
    block: {
      block: kind,
      path: `${kind}s/${number}`,
      label: `${WORDS[kind]} ${number}`,
      text: text.text,
      place: place(text, context),
    },
    content: { block: kind, text: plainText(text.text) },
    uses: [],
  };
}
