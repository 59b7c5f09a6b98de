import type { LocatedDiagnostic } from '../diagnostics/located-diagnostic.ts';
import { roundTo } from '../numeric/round.ts';
import { digestJson } from '../seal/digest.ts';
import { describeType } from '../units/dimensions.ts';
import { fromSi } from '../units/convert.ts';
import { CORE_VERSION } from '../version.ts';
import { cautionsFor } from './cautions.ts';
import { nested } from '../axes/column.ts';
import { ATMOSPHERE_PATH, type DraftContext } from './draft.ts';
import { reportAxis } from './figure-drafts.ts';
import { valueOf } from './values.ts';
import type { EvaluatedSheet, Value } from './evaluated-sheet.ts';
import { makeBlocks } from './make-blocks.ts';
import type { Block, CheckBlock, CheckResult, Hold, Quantity, Report } from './model.ts';

/**
 * Makes the canonical report of an evaluated sheet: plain JSON, with printed digits, TeX, sources and digests.
 *
 * @param sheet       all values known, no error standing
 * @param lineOf      line (from 1) of a place in the sheet's files
 * @param diagnostics the warnings that the report records
 */
export function buildReport(
  sheet: EvaluatedSheet,
  lineOf: DraftContext['lineOf'],
  diagnostics: readonly LocatedDiagnostic[],
): Report {
  const sections = makeBlocks(sheet, lineOf);
  const blocks = sections.flatMap((section) => section.blocks);
  const checks = blocks.filter((block) => block.block === 'check');
  const holds = collectHolds(blocks);
  const failed = checks.filter((check) => check.status === 'fail').length;
  const { document } = sheet;
  return {
    antinode: 'report/1',
    core: CORE_VERSION,
    sheet: {
      number: document.number.text,
      title: document.title.text,
      units: sheet.units,
      digest: sheetDigest(sheet, blocks),
      atmosphere: atmosphereOf(blocks),
    },
    summary: {
      blocks: blocks.length,
      passed: checks.length - failed,
      failed,
      holds: holds.length,
      governing: governingCheck(checks),
    },
    axes: [...sheet.axes.values()].map(reportAxis),
    quantities: collectQuantities(sheet, blocks),
    checks: checks.map(checkResult),
    holds,
    sections,
    sources: document.sources.map(({ id, text }) => ({ id: id.text, text: text.text })),
    cautions: cautionsFor({ holds: holds.length, failed }),
    diagnostics,
  };
}

function atmosphereOf(blocks: readonly Block[]): Report['sheet']['atmosphere'] {
  const block = blocks.find(({ path }) => path === ATMOSPHERE_PATH);
  return block?.block === 'input' ? block.printed : null;
}

function sheetDigest(sheet: EvaluatedSheet, blocks: readonly Block[]): string {
  const { number, title, sources } = sheet.document;
  return digestJson({
    number: number.text,
    title: title.text,
    units: sheet.units,
    sources: sources.map(({ id, text }) => [id.text, text.text]).toSorted(),
    blocks: blocks.map(({ path, digest }) => [path, digest]).toSorted(),
  });
}

function collectHolds(blocks: readonly Block[]): Hold[] {
  return blocks.flatMap((block) =>
    (block.block === 'input' || block.block === 'column') && block.hold !== undefined
      ? [{ path: block.path, name: block.name, label: block.label, reason: block.hold }]
      : [],
  );
}

/** The check with the highest utilisation, among those that have one. */
function governingCheck(checks: readonly CheckBlock[]): Report['summary']['governing'] {
  const rated = checks.flatMap(({ path, label, utilisation, at }) =>
    utilisation === null ? [] : [{ path, label, utilisation, ...(at === undefined ? {} : { at }) }],
  );
  return rated.reduce<Report['summary']['governing']>(
    (worst, check) => (worst === null || check.utilisation > worst.utilisation ? check : worst),
    null,
  );
}

/** The values of all names, in the order of the blocks; the atmosphere is a block, but not a name of the sheet. */
function collectQuantities(sheet: EvaluatedSheet, blocks: readonly Block[]): Record<string, Quantity> {
  const quantities: Record<string, Quantity> = {};
  for (const block of blocks) {
    if (block.block !== 'input' && block.block !== 'step' && block.block !== 'taken') continue;
    if (block.path === ATMOSPHERE_PATH) continue;
    const named = valueOf(block.name, sheet);
    if (named === undefined) throw new Error(`no value for ${block.path}`);
    quantities[block.name] = quantity(block, named.value, named.typed?.number, sheet);
  }
  return quantities;
}

function quantity(
  block: Extract<Block, { block: 'input' | 'step' | 'taken' }>,
  { type, column, unit }: Value,
  typed: number | undefined,
  { axes, site }: EvaluatedSheet,
): Quantity {
  return {
    value:
      (column.axes.length === 0 ? typed : undefined) ??
      nested(column, axes, (si) => roundTo(fromSi(si, unit, site), 15)),
    unit: unit.text,
    si: nested(column, axes, (si) => si),
    dimension: describeType(type),
    axes: column.axes.flatMap((name) => {
      const axis = axes.get(name);
      return axis === undefined ? [] : [reportAxis(axis)];
    }),
    label: block.label,
    digest: block.digest,
    printed: block.printed,
    path: block.path,
  };
}

function checkResult({ path, that, label, status, utilisation, governing }: CheckBlock): CheckResult {
  return { path, that, label, status, utilisation, governing };
}
