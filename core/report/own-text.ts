import type { TextChange } from './comparison.ts';
import { mention } from './mention.ts';
import type { Block } from './model.ts';

/** What of a block's words changed, one by one. Values, formulas and demands of checks are not among them. */
export function textChanges(before: Block, after: Block): TextChange[] {
  const [old, now] = [wordsOf(before), wordsOf(after)];
  return [...new Set([...old.keys(), ...now.keys()])].flatMap((what) => {
    const [from, to] = [old.get(what) ?? '', now.get(what) ?? ''];
    if (what === 'text' && after.block === 'text' && withoutValues(from) === withoutValues(to)) return [];
    return from === to ? [] : [{ ...mention(after), what, before: from, after: to }];
  });
}

function wordsOf(block: Block): ReadonlyMap<string, string> {
  const words: readonly (readonly [string, string | undefined])[] = [
    ['kind', kindOf(block)],
    ['label', isStatement(block) ? undefined : block.label],
    ['note', block.note],
    ['source', block.source],
    ['symbol', 'symbol' in block ? block.symbol : undefined],
    ['tolerance', 'tolerance' in block ? block.tolerance : undefined],
    ['expectation', 'expect' in block ? block.expect?.range : undefined],
    ['hold', 'hold' in block ? block.hold : undefined],
    ['text', textOf(block)],
  ];
  return new Map(words.flatMap(([what, text]) => (text === undefined ? [] : [[what, text] as const])));
}

/** A column of the operating conditions is an input, but not one value. */
function kindOf({ block, path }: Block): string {
  return block === 'input' && path.startsWith('conditions/') ? 'column' : block;
}

/** The label of a statement only counts it. */
function isStatement({ block }: Block): boolean {
  return block === 'assumption' || block === 'exclusion' || block === 'reference';
}

function textOf(block: Block): string | undefined {
  switch (block.block) {
    case 'text':
      return block.markdown;
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return block.text;
    case 'table':
      return block.columns.map(({ name, unit }) => (unit === '' ? name : `${name} in ${unit}`)).join(', ');
    case 'figure':
      return figureText(block);
    case 'gas':
      return block.method;
    case 'input':
    case 'column':
    case 'taken':
    case 'lookup':
    case 'step':
    case 'check':
      return undefined;
  }
}

function figureText({ kind, formula, limit, unit }: Extract<Block, { block: 'figure' }>): string {
  const held = limit === undefined ? '' : ` against ${limit.formula}`;
  return `${kind} of ${formula}${held}${unit === '' ? '' : ` in ${unit}`}`;
}

/** Prose shows values of the sheet; where only they differ, the prose is as it was. */
function withoutValues(markdown: string): string {
  return markdown.replace(/[-−]?\d[\d.]*(?:e[-−]?\d+)?(?: to [-−]?\d[\d.]*(?:e[-−]?\d+)?)?/g, '#');
}
