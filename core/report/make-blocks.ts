import { projectCell } from '../axes/shape.ts';
import { symbolFor } from '../expression/tex-symbol.ts';
import type { Text } from '../sheet/document.ts';
import type { Printed } from '../units/printed.ts';
import { atmosphereDraft, gasDraft, inputDraft, lookupDraft, statementDraft, takenDraft } from './basis-drafts.ts';
import { blockDigests } from './block-digests.ts';
import { columnDraft } from './condition-drafts.ts';
import type { Case, Draft, DraftContext } from './draft.ts';
import type { EvaluatedSheet } from './evaluated-sheet.ts';
import { figureDraft, tableDraft } from './figure-drafts.ts';
import type { Block, ReportSection, StatementBlock } from './model.ts';
import { inAbsolute, printCell, printInput, printValue } from './print-value.ts';
import { checkDraft, stepDraft, textDraft } from './section-drafts.ts';
import { valueOf } from './values.ts';

interface DraftSection {
  readonly path: string;
  readonly title: string;
  readonly drafts: readonly Draft[];
}

/** All blocks of a sheet in reading order, section by section, each with its digest. */
export function makeBlocks(sheet: EvaluatedSheet, lineOf: DraftContext['lineOf']): readonly ReportSection[] {
  const context = makeContext(sheet, lineOf);
  const sections = [...basisSections(context), ...ownSections(context), ...closingSections(context)].filter(
    ({ drafts }) => drafts.length > 0,
  );
  const digests = digestsOf(sections.flatMap(({ drafts }) => drafts));
  return sections.map(({ path, title, drafts }) => {
    const blocks = drafts.map((draft) => withDigest(draft, digests));
    return { path, title, blocks, utilisation: worstUtilisation(blocks) };
  });
}

function basisSections(context: DraftContext): DraftSection[] {
  const { sheet } = context;
  const { document } = sheet;
  const statements = (kind: StatementBlock['block'], texts: readonly Text[]): Draft[] =>
    texts.map((text, i) => statementDraft(kind, text, i + 1, context));
  return [
    {
      path: 'inputs',
      title: 'Basis and inputs',
      drafts: [
        ...(document.atmosphere === undefined ? [] : atmosphereDraft(document.atmosphere, context)),
        ...[...sheet.inputs.values()].map((input) => inputDraft(input, context)),
      ],
    },
    {
      path: 'taken',
      title: 'Taken from other sheets',
      drafts: [...sheet.taken.values()].map((taken) => takenDraft(taken, context)),
    },
    {
      path: 'conditions',
      title: 'Operating conditions',
      drafts: sheet.columns.map((column) => columnDraft(column, context)),
    },
    { path: 'gases', title: 'Gases', drafts: sheet.gases.map((gas) => gasDraft(gas, context)) },
    { path: 'tables', title: 'Tables', drafts: sheet.lookups.map((lookup) => lookupDraft(lookup, context)) },
    { path: 'assumptions', title: 'Assumptions', drafts: statements('assumption', document.assumptions) },
    { path: 'exclusions', title: 'Exclusions', drafts: statements('exclusion', document.exclusions) },
  ];
}

function ownSections(context: DraftContext): DraftSection[] {
  const { document, steps, checks, figures } = context.sheet;
  return document.sections.map((section, i) => {
    const path = `sections/${i + 1}`;
    const drafts = [
      ...(section.text === undefined ? [] : [textDraft(`${path}/text`, section.text, context)]),
      ...section.steps.flatMap((node) => {
        const step = steps.get(node.name.text);
        return step === undefined ? [] : [stepDraft(`${path}/steps/${node.name.text}`, step, context)];
      }),
      ...section.tables.map((node, n) => tableDraft(`${path}/tables/${n + 1}`, node, context)),
      ...section.figures.flatMap((node, n) => {
        const figure = figures.get(node);
        return figure === undefined ? [] : [figureDraft(`${path}/figures/${n + 1}`, figure, context)];
      }),
      ...section.checks.flatMap((node, n) => {
        const check = checks.get(node);
        return check === undefined ? [] : [checkDraft(`${path}/checks/${n + 1}`, check, context)];
      }),
    ];
    return { path, title: section.title.text, drafts };
  });
}

/** For further reading: behind all that the sheet rests on. */
function closingSections(context: DraftContext): DraftSection[] {
  const drafts = context.sheet.document.references.map((text, i) => statementDraft('reference', text, i + 1, context));
  return [{ path: 'references', title: 'References', drafts }];
}

function makeContext(sheet: EvaluatedSheet, lineOf: DraftContext['lineOf']): DraftContext {
  const paths = pathsByName(sheet);
  const symbols = symbolsByName(sheet);
  const context: DraftContext = {
    sheet,
    lineOf,
    pathOf: (name) => paths.get(name),
    symbolOf: (name) => symbols.get(name) ?? symbolFor(name),
    printedOf: (name, one) => printedValue(name, one, context),
  };
  return context;
}

function pathsByName({ document, gases, taken, columns, lookups }: EvaluatedSheet): ReadonlyMap<string, string> {
  const under = (folder: string, nodes: Iterable<{ readonly name: Text }>): [string, string][] =>
    Array.from(nodes, ({ name }) => [name.text, `${folder}/${name.text}`]);
  return new Map([
    ...under(
      'gases',
      gases.map(({ node }) => node),
    ),
    ...under(
      'tables',
      lookups.map(({ node }) => node),
    ),
    ...under(
      'taken',
      [...taken.values()].map(({ node }) => node),
    ),
    ...under(
      'conditions',
      columns.map(({ node }) => node),
    ),
    ...under('inputs', document.inputs),
    ...document.sections.flatMap(({ steps }, i) => under(`sections/${i + 1}/steps`, steps)),
  ]);
}

function symbolsByName({ document }: EvaluatedSheet): ReadonlyMap<string, string> {
  const { inputs, take, lookups, conditions, sections } = document;
  const named = [
    ...inputs,
    ...take,
    ...lookups,
    ...(conditions?.columns ?? []),
    ...sections.flatMap(({ steps }) => steps),
  ];
  return new Map(named.map(({ name, symbol }) => [name.text, symbolFor(name.text, symbol?.text)]));
}

/** The value with which formulas compute, in one case: a gauge reading as the absolute pressure that it is. */
function printedValue(name: string, one: Case, context: DraftContext): Printed | undefined {
  const named = valueOf(name, context.sheet);
  if (named === undefined) return undefined;
  const { value, typed, digits } = named;
  if (typed !== null && !value.unit.gauge && value.column.axes.length === 0)
    return printInput(value, typed, digits, context);
  const cell = projectCell(one.cell, one.axes, value.column.axes, context.sheet.axes);
  const absolute = inAbsolute(value);
  return cell === null ? printValue(absolute, digits, context) : printCell(absolute, cell, digits, context);
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
