import type { LocatedDiagnostic } from '../diagnostics/located-diagnostic.ts';
import { digestJson } from '../seal/digest.ts';
import { describeType } from '../units/dimensions.ts';
import { fromSi } from '../units/convert.ts';
import { CORE_VERSION } from '../version.ts';
import { cautionsFor } from './cautions.ts';
import { ATMOSPHERE_PATH } from './draft.ts';
import type { EvaluatedSheet, Value } from './evaluated-sheet.ts';
import { makeBlocks } from './make-blocks.ts';
import type { Block, CheckBlock, CheckResult, Hold, Quantity, Report } from './model.ts';

/**
 * Makes the canonical report of an evaluated sheet: plain JSON, with printed digits, TeX, sources and digests.
 *
 * @param sheet       all values known, no error standing
 * @param lineOf      line (from 1) of an offset in the sheet's file
 * @param diagnostics the warnings that the report records
 */
export function buildReport(
  sheet: EvaluatedSheet,
  lineOf: (offset: number) => number,
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
    block.block === 'input' && block.hold !== undefined
      ? [{ path: block.path, name: block.name, label: block.label, reason: block.hold }]
      : [],
  );
}

/** The check with the highest utilisation, among those that have one. */
function governingCheck(checks: readonly CheckBlock[]): Report['summary']['governing'] {
  const rated = checks.flatMap(({ path, label, utilisation }) =>
    utilisation === null ? [] : [{ path, label, utilisation }],
  );
  return rated.reduce<Report['summary']['governing']>(
    (worst, check) => (worst === null || check.utilisation > worst.utilisation ? check : worst),
    null,
  );
}

function collectQuantities(sheet: EvaluatedSheet, blocks: readonly Block[]): Record<string, Quantity> {
  const quantities: Record<string, Quantity> = {};
  for (const block of blocks) {
    // The atmosphere is a block, but not a name of the sheet.
    if ((block.block !== 'input' && block.block !== 'step') || block.path === ATMOSPHERE_PATH) continue;
    const input = sheet.inputs.get(block.name);
    const value = (input ?? sheet.steps.get(block.name))?.value;
    if (value === undefined) throw new Error(`no value for ${block.path}`);
    const number = input?.typed?.number ?? fromSi(value.si, value.unit, sheet.site);
    quantities[block.name] = quantity(block, value, number);
  }
  return quantities;
}

function quantity(block: Extract<Block, { block: 'input' | 'step' }>, value: Value, number: number): Quantity {
  return {
    value: number,
    unit: value.unit.text,
    si: value.si,
    dimension: describeType(value.type),
    axes: [],
    label: block.label,
    digest: block.digest,
    printed: block.printed,
    path: block.path,
  };
}

function checkResult({ path, that, label, status, utilisation }: CheckBlock): CheckResult {
  return { path, that, label, status, utilisation, governing: {} };
}
