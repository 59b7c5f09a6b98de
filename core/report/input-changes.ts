import { ownQuantity } from './compare-reports.ts';
import type { InputChange, PartChange } from './comparison.ts';
import { mention } from './mention.ts';
import type { Block, ColumnBlock, InputBlock, LookupBlock, Report } from './model.ts';
import { valueChange, type ValueChange } from './value-change.ts';

/** The change of something given: an input, a column, a taken value, a gas or a table; null where it is as before. */
export function inputChange(a: Block, b: Block, before: Report, after: Report): InputChange | null {
  const [from, to] = [typedText(a), typedText(b)];
  if (from === undefined || to === undefined) return null;
  const change = numberChange(b, before, after);
  const parts = partChanges(a, b, before, after);
  if (from === to && change === null && parts.length === 0) return null;
  return { ...mention(b), before: from, after: to, change, parts };
}

/** What the sheet says of something given; undefined for all other blocks. */
function typedText(block: Block): string | undefined {
  switch (block.block) {
    case 'input':
      return block.typed.trim().replace(/\s+/g, ' ');
    case 'column':
      return block.cells.join(', ');
    case 'taken':
      return block.from;
    case 'gas':
      return block.fractions.map(({ component, percent }) => `${component} ${percent} %`).join(', ');
    case 'lookup':
      return block.rows.map((row) => row.join(' ')).join('; ');
    case 'step':
    case 'check':
    case 'text':
    case 'table':
    case 'figure':
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return undefined;
  }
}

function numberChange(block: Block, before: Report, after: Report): ValueChange | null {
  if (block.block !== 'input' && block.block !== 'taken') return null;
  const [from, to] = [ownQuantity(before, block.name), ownQuantity(after, block.name)];
  return from === undefined || to === undefined ? null : valueChange(from, to);
}

function partChanges(a: Block, b: Block, before: Report, after: Report): PartChange[] {
  if (hasCells(a) && hasCells(b)) return differing(conditionCells(a, before), conditionCells(b, after));
  if (a.block === 'gas' && b.block === 'gas') return differing(shares(a), shares(b));
  return a.block === 'lookup' && b.block === 'lookup' ? differing(rows(a), rows(b)) : [];
}

type ColumnOfConditions = (InputBlock | ColumnBlock) & { readonly cells: readonly string[] };

function hasCells(block: Block): block is ColumnOfConditions {
  return (block.block === 'input' || block.block === 'column') && block.cells !== undefined;
}

function conditionCells(block: ColumnOfConditions, { axes }: Report): ReadonlyMap<string, string> {
  const ids = axes.find(({ name }) => name === 'condition')?.values ?? [];
  const unit = block.block === 'input' && block.printed.unit !== '' ? ` ${block.printed.unit}` : '';
  return new Map(block.cells.map((cell, i) => [String(ids[i] ?? ''), `${cell}${unit}`]));
}

function shares({ fractions }: Extract<Block, { block: 'gas' }>): ReadonlyMap<string, string> {
  return new Map(
    fractions.map(({ component, percent, tolerance }) => [
      component,
      tolerance === undefined ? `${percent} %` : `${percent} % ${tolerance}`,
    ]),
  );
}

/** A row of a table is known by its first cell, the argument. */
function rows({ rows: all }: LookupBlock): ReadonlyMap<string, string> {
  return new Map(all.map(([argument = '', ...values]) => [argument, values.join(' ')]));
}

const ABSENT = '–';

/** Parts of both that differ, and those that only one has. */
function differing(before: ReadonlyMap<string, string>, after: ReadonlyMap<string, string>): PartChange[] {
  return [...new Set([...before.keys(), ...after.keys()])].flatMap((part) => {
    const [from, to] = [before.get(part) ?? ABSENT, after.get(part) ?? ABSENT];
    return from === to ? [] : [{ part, before: from, after: to }];
  });
}
