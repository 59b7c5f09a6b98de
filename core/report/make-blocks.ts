import { symbolFor } from '../expression/tex-symbol.ts';
import { absoluteUnit } from '../units/display.ts';
import { printQuantity } from '../units/print.ts';
import type { Printed } from '../units/printed.ts';
import { assumptionDraft, atmosphereDraft, gasDraft, inputDraft, printInput, printOptions } from './basis-drafts.ts';
import { blockDigests } from './block-digests.ts';
import type { Draft, DraftContext } from './draft.ts';
import type { EvaluatedSheet } from './evaluated-sheet.ts';
import type { Block, ReportSection } from './model.ts';
import { checkDraft, stepDraft, textDraft } from './section-drafts.ts';

interface DraftSection {
  readonly path: string;
  readonly title: string;
  readonly drafts: readonly Draft[];
}

/** All blocks of a sheet in reading order, section by section, each with its digest. */
export function makeBlocks(sheet: EvaluatedSheet, lineOf: (offset: number) => number): readonly ReportSection[] {
  const context = makeContext(sheet, lineOf);
  const sections = [...basisSections(context), ...ownSections(context)].filter(({ drafts }) => drafts.length > 0);
  const digests = digestsOf(sections.flatMap(({ drafts }) => drafts));
  return sections.map(({ path, title, drafts }) => {
    const blocks = drafts.map((draft) => withDigest(draft, digests));
    return { path, title, blocks, utilisation: worstUtilisation(blocks) };
  });
}

function basisSections(context: DraftContext): DraftSection[] {
  const { sheet } = context;
  const { document } = sheet;
  return [
    {
      path: 'inputs',
      title: 'Basis and inputs',
      drafts: [
        ...(document.atmosphere === undefined ? [] : atmosphereDraft(document.atmosphere, context)),
        ...[...sheet.inputs.values()].map((input) => inputDraft(input, context)),
      ],
    },
    { path: 'gases', title: 'Gases', drafts: sheet.gases.map((gas) => gasDraft(gas, context)) },
    {
      path: 'assumptions',
      title: 'Assumptions',
      drafts: document.assumptions.map((text, i) => assumptionDraft(text, i + 1, context)),
    },
  ];
}

function ownSections(context: DraftContext): DraftSection[] {
  const { document, steps, checks } = context.sheet;
  return document.sections.map((section, i) => {
    const path = `sections/${i + 1}`;
    const drafts = [
      ...(section.text === undefined ? [] : [textDraft(`${path}/text`, section.text, context)]),
      ...section.steps.flatMap((node) => {
        const step = steps.get(node.name.text);
        return step === undefined ? [] : [stepDraft(`${path}/steps/${node.name.text}`, step, context)];
      }),
      ...section.checks.flatMap((node, n) => {
        const check = checks.get(node);
        return check === undefined ? [] : [checkDraft(`${path}/checks/${n + 1}`, check, context)];
      }),
    ];
    return { path, title: section.title.text, drafts };
  });
}

function makeContext(sheet: EvaluatedSheet, lineOf: (offset: number) => number): DraftContext {
  const paths = pathsByName(sheet);
  const symbols = symbolsByName(sheet);
  const context: DraftContext = {
    sheet,
    lineOf,
    pathOf: (name) => paths.get(name),
    symbolOf: (name) => symbols.get(name) ?? symbolFor(name),
    printedOf: (name) => printedValue(name, context),
  };
  return context;
}

function pathsByName({ document, gases }: EvaluatedSheet): ReadonlyMap<string, string> {
  return new Map([
    ...gases.map(({ node }) => [node.name.text, `gases/${node.name.text}`] as const),
    ...document.inputs.map(({ name }) => [name.text, `inputs/${name.text}`] as const),
    ...document.sections.flatMap(({ steps }, i) =>
      steps.map(({ name }) => [name.text, `sections/${i + 1}/steps/${name.text}`] as const),
    ),
  ]);
}

function symbolsByName({ document }: EvaluatedSheet): ReadonlyMap<string, string> {
  const named = [...document.inputs, ...document.sections.flatMap(({ steps }) => steps)];
  return new Map(named.map(({ name, symbol }) => [name.text, symbolFor(name.text, symbol?.text)]));
}

/** As {@link printInput}, but gauge readings as the absolute pressures with which formulas compute. */
function printedValue(name: string, context: DraftContext): Printed | undefined {
  const input = context.sheet.inputs.get(name);
  const step = context.sheet.steps.get(name);
  const value = (input ?? step)?.value;
  if (value === undefined) return undefined;
  const digits = (input ?? step)?.node.digits;
  if (input !== undefined && !value.unit.gauge) return printInput(value, input.typed, digits, context);
  return printQuantity(value.si, absoluteUnit(value.unit), printOptions(digits, context));
}

function digestsOf(drafts: readonly Draft[]): ReadonlyMap<string, string> {
  return blockDigests(drafts.map(({ block, content, uses }) => ({ path: block.path, content, uses })));
}

function withDigest({ block }: Draft, digests: ReadonlyMap<string, string>): Block {
  const digest = digests.get(block.path);
  if (digest === undefined) throw new Error(`no digest for ${block.path}`);
  return { ...block, digest };
}

function worstUtilisation(blocks: readonly Block[]): number | null {
  const rated = blocks.flatMap((block) =>
    block.block === 'check' && block.utilisation !== null ? [block.utilisation] : [],
  );
  return rated.length === 0 ? null : Math.max(...rated);
}
