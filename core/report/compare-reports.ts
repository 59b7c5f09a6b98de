import type { Nested } from '../axes/column.ts';
import type { Block, FigureBlock, Quantity, Report } from './model.ts';

/** One place in which two reports differ, as a person reads it. */
export interface ReportDifference {
  readonly path: string;
  readonly yours: string;
  readonly ours: string;
}

/** Engines differ in the last bits of transcendental functions; a re-run must agree within this, relative. */
export const RERUN_TOLERANCE = 1e-9;

/**
 * Compares a recorded report with one made again from the same sources. Equal means: the same blocks with the same
 * digests, printed digits equal, SI values within 1e-9 relative, the same checks and holds. The version of the core
 * and the diagnostics are not compared: a later version may word or warn otherwise.
 */
export function compareReports(yours: Report, ours: Report): readonly ReportDifference[] {
  return [
    ...differences('sheet', yours.sheet, ours.sheet),
    ...compareQuantities(yours, ours),
    ...compareBlocks(yours, ours),
    ...differences('checks', withoutUtilisation(yours), withoutUtilisation(ours)),
    ...differences('holds', yours.holds, ours.holds),
    ...differences('sources', yours.sources, ours.sources),
    ...differences('cautions', yours.cautions, ours.cautions),
    ...compareSummaries(yours, ours),
  ];
}

function compareQuantities(yours: Report, ours: Report): ReportDifference[] {
  return union(Object.keys(yours.quantities), Object.keys(ours.quantities)).flatMap((name) => {
    const mine = ownQuantity(yours, name);
    const theirs = ownQuantity(ours, name);
    const equal = mine !== undefined && theirs !== undefined && sameQuantity(mine, theirs);
    return equal ? [] : [{ path: `quantities/${name}`, yours: show(mine), ours: show(theirs) }];
  });
}

/** A sheet may name a quantity `constructor`; only the report's own entries count. */
export function ownQuantity({ quantities }: Report, name: string): Quantity | undefined {
  return Object.hasOwn(quantities, name) ? quantities[name] : undefined;
}

function sameQuantity(a: Quantity, b: Quantity): boolean {
  const { value: valueA, si: siA, ...restA } = a;
  const { value: valueB, si: siB, ...restB } = b;
  return close(valueA, valueB) && close(siA, siB) && same(restA, restB);
}

function compareBlocks(yours: Report, ours: Report): ReportDifference[] {
  const mine = blocksByPath(yours);
  const theirs = blocksByPath(ours);
  const blocks = union([...mine.keys()], [...theirs.keys()]).flatMap((path) => {
    const [a, b] = [mine.get(path), theirs.get(path)];
    return a !== undefined && b !== undefined && sameBlock(a, b)
      ? []
      : [{ path, yours: showBlock(a), ours: showBlock(b) }];
  });
  const outline = ({ sections }: Report): unknown =>
    sections.map(({ path, title, blocks: inside }) => ({ path, title, blocks: inside.map((block) => block.path) }));
  return [...blocks, ...differences('sections', outline(yours), outline(ours))];
}

function sameBlock(a: Block, b: Block): boolean {
  if (a.block === 'figure' && b.block === 'figure') return sameFigure(a, b);
  if (a.block !== 'check' || b.block !== 'check') return same(a, b);
  const { utilisation: utilisationA, ...restA } = a;
  const { utilisation: utilisationB, ...restB } = b;
  return closeOrNull(utilisationA, utilisationB) && same(restA, restB);
}

/** What a figure draws are numbers, compared as such; all its words must be the same. */
function sameFigure(a: FigureBlock, b: FigureBlock): boolean {
  const { series: seriesA, limit: limitA, ...restA } = a;
  const { series: seriesB, limit: limitB, ...restB } = b;
  const words = ({ series, limit }: FigureBlock): unknown => [series.map(({ label }) => label), limit?.formula ?? null];
  const values = (series: FigureBlock['series'], limit: FigureBlock['limit']): Nested => [
    ...series.map((line) => line.values),
    limit?.values ?? [],
  ];
  return same(restA, restB) && same(words(a), words(b)) && close(values(seriesA, limitA), values(seriesB, limitB));
}

function compareSummaries(yours: Report, ours: Report): ReportDifference[] {
  const facts = ({ summary: { governing, ...counts } }: Report): unknown => ({
    ...counts,
    governs: governing?.path ?? null,
  });
  const governing = closeOrNull(
    yours.summary.governing?.utilisation ?? null,
    ours.summary.governing?.utilisation ?? null,
  );
  if (governing && same(facts(yours), facts(ours))) return [];
  return [{ path: 'summary', yours: JSON.stringify(yours.summary), ours: JSON.stringify(ours.summary) }];
}

function withoutUtilisation(report: Report): unknown {
  return report.checks.map(({ path, that, label, status, governing }) => ({ path, that, label, status, governing }));
}

function blocksByPath(report: Report): Map<string, Block> {
  return new Map(report.sections.flatMap((section) => section.blocks.map((block) => [block.path, block] as const)));
}

function differences(path: string, a: unknown, b: unknown): ReportDifference[] {
  return same(a, b) ? [] : [{ path, yours: JSON.stringify(a), ours: JSON.stringify(b) }];
}

function union(a: readonly string[], b: readonly string[]): string[] {
  return [...new Set([...a, ...b])];
}

/** Equal within the tolerance; arrays of numbers are compared one by one. */
export function close(a: Nested, b: Nested): boolean {
  if (typeof a === 'number' && typeof b === 'number')
    return a === b || Math.abs(a - b) <= RERUN_TOLERANCE * Math.max(Math.abs(a), Math.abs(b));
  if (typeof a === 'number' || typeof b === 'number') return false;
  return a.length === b.length && a.every((part, i) => close(part, b[i] ?? Number.NaN));
}

export function closeOrNull(a: number | null, b: number | null): boolean {
  return a === null || b === null ? a === b : close(a, b);
}

/** Structural equality of JSON values; the order of keys does not matter. */
function same(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const left = Object.entries(a);
  const right = b as Readonly<Record<string, unknown>>;
  return (
    left.length === Object.keys(b).length &&
    left.every(([key, value]) => Object.hasOwn(right, key) && same(value, right[key]))
  );
}

function show(quantity: Quantity | undefined): string {
  if (quantity === undefined) return 'absent';
  const { printed, si } = quantity;
  return `${printed.number} ${printed.unit} (${typeof si === 'number' ? si : 'several values in'} SI)`;
}

function showBlock(block: Block | undefined): string {
  if (block === undefined) return 'absent';
  if (block.block === 'check') return `${block.label}: ${block.status}, utilisation ${block.utilisation ?? 'none'}`;
  return 'printed' in block ? `${block.label}: ${block.printed.number} ${block.printed.unit}` : block.label;
}
