import { ATMOSPHERE_PATH } from '../../../core/report/draft.ts';
import type {
  Expectation,
  GasBlock,
  InputBlock,
  LookupBlock,
  StatementBlock,
  TakenBlock,
} from '../../../core/report/model.ts';
import type { Paint } from '../../terminal.ts';
import { gridLines } from './grid.ts';
import { cutAfter, moreLine } from './thin.ts';
import {
  type Detail,
  detailLines,
  extentDetail,
  INDENT,
  noteLines,
  padEnd,
  padStart,
  plain,
  proseDetail,
  spaced,
  widest,
  wrap,
} from './layout.ts';

export function inputLines(blocks: readonly InputBlock[], paint: Paint): string[] {
  const rows = blocks.map((block) => ({
    block,
    value: plain(block.printed),
    aside: block.tolerance ?? '',
    origin: originText(block.hold, originOf(block), paint),
    details: expectationDetail(block.expect, paint),
  }));
  return valueLines(rows, paint);
}

export function takenLines(blocks: readonly TakenBlock[], paint: Paint): string[] {
  const rows = blocks.map((block) => ({
    block,
    value: plain(block.printed),
    aside: '',
    origin: paint('dim', [`from ${block.from}`, block.source ?? ''].filter((text) => text !== '').join(', ')),
    details: [...extentDetail(block.extent, paint), [paint('dim', `revision ${block.revision}`)]],
  }));
  return valueLines(rows, paint);
}

interface ValueRow {
  readonly block: InputBlock | TakenBlock;
  readonly value: string;
  readonly aside: string;
  readonly origin: string;
  readonly details: readonly Detail[];
}

/** One line a value: label, name, value, how far it may be off, and where it is from. */
function valueLines(rows: readonly ValueRow[], paint: Paint): string[] {
  const label = widest(rows.map(({ block }) => block.label));
  const name = widest(rows.map(({ block }) => block.name));
  const value = widest(rows.map((row) => row.value));
  const aside = widest(rows.map((row) => row.aside));
  return rows.flatMap((row) => {
    const cells = [padEnd(row.block.label, label), padEnd(row.block.name, name), padStart(row.value, value)];
    const tolerance = aside === 0 ? [] : [padEnd(row.aside, aside)];
    const line = `${INDENT}${[...cells, ...tolerance, row.origin].join('  ')}`.trimEnd();
    return [line, ...detailLines(row.details, (text) => text), ...noteLines(row.block, paint)];
  });
}

function originOf({ path, source }: InputBlock): string {
  return source ?? (path === ATMOSPHERE_PATH ? 'as this sheet states' : 'no source');
}

export function originText(hold: string | undefined, source: string, paint: Paint): string {
  return hold === undefined ? paint('dim', source) : paint('yellow', '◔ hold');
}

/** A value that nobody expects must catch the eye; one that is as expected must not. */
export function expectationDetail(expect: Expectation | undefined, paint: Paint): Detail[] {
  if (expect === undefined) return [];
  const { range, within } = expect;
  if (within) return [[paint('dim', `expected ${range}`)]];
  return [[paint('yellow', `△ outside of what is expected: ${range}`)]];
}

export function gasLines(blocks: readonly GasBlock[], paint: Paint): string[] {
  return blocks.flatMap((block) => {
    const shares = block.fractions.map(
      ({ component, percent, tolerance }) =>
        `${component} ${percent} %${tolerance === undefined ? '' : ` ${tolerance}`}`,
    );
    const title = block.label === block.name ? block.name : `${block.label}, ${block.name}`;
    const source = block.source === undefined ? [] : [proseDetail(block.source)];
    return [
      ...wrap(`${title} (${block.method}): ${shares.join(', ')}`, INDENT),
      ...detailLines(source, (text) => paint('dim', text)),
      ...noteLines(block, paint),
    ];
  });
}

/** Rows shown of a table in a terminal; all are in the other forms. */
const LOOKUP_ROWS = 24;

export function lookupLines(blocks: readonly LookupBlock[], paint: Paint): string[] {
  return spaced(
    blocks.map((block) => {
      const title = block.label === block.name ? block.name : `${block.label}, ${block.name}`;
      const origin = block.source === undefined ? '' : paint('dim', `  ${block.source}`);
      const [first, ...rest] = block.columns.map(({ name, unit }, i) => ({
        head: [name, unit],
        cells: cutAfter(block.rows, LOOKUP_ROWS).map((row) => row[i] ?? ''),
        align: 'right' as const,
      }));
      return [
        `${INDENT}${title}${origin}`,
        ...noteLines(block, paint),
        ...(first === undefined ? [] : gridLines(first, rest, paint)),
        ...moreLine(block.rows.length, LOOKUP_ROWS, paint),
      ];
    }),
  );
}

/** Assumptions, exclusions and references have the numbers that their paths have. */
export function statementLines(blocks: readonly StatementBlock[]): string[] {
  return blocks.flatMap((block, i) => wrap(block.text, `${INDENT}${i + 1}. `));
}

/** Prose as it was typed; each paragraph is filled anew. */
export function proseLines(markdown: string): string[] {
  return spaced(
    markdown
      .trim()
      .split(/\n\s*\n/)
      .map((paragraph) => wrap(paragraph.replace(/[ \t\r\n]+/g, ' '), INDENT)),
  );
}
