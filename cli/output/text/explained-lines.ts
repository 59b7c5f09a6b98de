import type { ExplainedBlock } from '../../../core/report/explain.ts';
import { ATMOSPHERE_PATH } from '../../../core/report/draft.ts';
import type {
  Block,
  CheckBlock,
  ColumnBlock,
  Expectation,
  GasBlock,
  InputBlock,
  LookupBlock,
  StepBlock,
  TakenBlock,
} from '../../../core/report/model.ts';
import { count } from '../print-diagnostics.ts';
import { plain } from './layout.ts';
import { STANDING, utilisationText, withoutConversion } from './working.ts';

export interface ExplainedLine {
  readonly text: string;
  readonly style?: 'bold' | 'dim' | 'yellow' | 'red';
}

/** What an explanation says of one block: its result first. */
export function explainedLines({ block, numbers, shown }: ExplainedBlock): ExplainedLine[] {
  if (shown === 'above') return [{ text: `${resultText(block)}, shown above`, style: 'dim' }];
  return [
    { text: headText(block), style: 'bold' },
    ...linesOf(block, numbers),
    ...(block.note === undefined ? [] : [{ text: block.note, style: 'dim' } as const]),
    ...(shown === 'deeper'
      ? [{ text: `explain ${nameOf(block)} to see what it rests on`, style: 'dim' } as const]
      : []),
  ];
}

function headText(block: Block): string {
  const name = nameOf(block);
  return block.label === name ? resultText(block) : `${resultText(block)} · ${block.label}`;
}

function resultText(block: Block): string {
  return 'printed' in block ? `${nameOf(block)} = ${plain(block.printed)}` : nameOf(block);
}

function nameOf(block: Block): string {
  if (block.block === 'check') return block.that;
  return 'name' in block ? block.name : block.label;
}

function linesOf(block: Block, numbers: string | undefined): ExplainedLine[] {
  switch (block.block) {
    case 'step':
      return stepLines(block, numbers);
    case 'check':
      return checkLines(block, numbers);
    case 'input':
    case 'column':
      return givenLines(block);
    case 'taken':
      return [{ text: `from ${block.from}, revision ${block.revision}`, style: 'dim' }, ...sourceLines(block)];
    case 'gas':
      return [{ text: `${block.method}: ${sharesText(block)}` }, ...sourceLines(block)];
    case 'lookup':
      return [{ text: lookupText(block), style: 'dim' }, ...sourceLines(block)];
    case 'text':
    case 'table':
    case 'figure':
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return [];
  }
}

function stepLines(block: StepBlock, numbers: string | undefined): ExplainedLine[] {
  const { calc, at, methods, expect } = block;
  return [
    { text: `= ${withoutConversion(calc)}` },
    ...(numbers === undefined || sameFormula(numbers, withoutConversion(calc))
      ? []
      : [numbersLine(`= ${numbers}`, at)]),
    ...extentLines(block),
    ...expectationLines(expect),
    ...methods.map(({ function: name, source }) => ({ text: `${name}: ${source}`, style: 'dim' }) as const),
    ...sourceLines(block),
  ];
}

/** A formula without names has no numbers to put in. */
function sameFormula(a: string, b: string): boolean {
  return a.replaceAll(' ', '') === b.replaceAll(' ', '');
}

function numbersLine(numbers: string, at: string | undefined): ExplainedLine {
  return { text: at === undefined || at === '' ? numbers : `${numbers}  (at ${at})` };
}

function checkLines(block: CheckBlock, numbers: string | undefined): ExplainedLine[] {
  const [glyph, word] = STANDING[block.standing];
  const failed = block.points?.failed ?? 0;
  return [
    ...(numbers === undefined ? [] : [numbersLine(numbers, block.at)]),
    {
      text: `${utilisationText(block)}  ${glyph} ${word}`,
      ...(block.status === 'fail' ? { style: 'red' as const } : {}),
    },
    ...(failed === 0 ? [] : [{ text: `fails at ${failed} of ${block.points?.all}`, style: 'red' as const }]),
    ...sourceLines(block),
  ];
}

function givenLines(block: InputBlock | ColumnBlock): ExplainedLine[] {
  const isInput = block.block === 'input';
  const cells = isInput ? [] : [{ text: block.cells.join(', ') }];
  return [
    ...cells,
    ...(isInput && block.tolerance !== undefined
      ? [{ text: `tolerance ${block.tolerance}`, style: 'dim' as const }]
      : []),
    ...(isInput ? expectationLines(block.expect) : []),
    ...(block.hold === undefined ? [] : [{ text: `◔ hold: ${block.hold}`, style: 'yellow' as const }]),
    ...(block.source === undefined && block.hold === undefined && block.path !== ATMOSPHERE_PATH
      ? [{ text: 'no source', style: 'yellow' as const }]
      : sourceLines(block)),
  ];
}

function extentLines({ extent }: StepBlock | TakenBlock): ExplainedLine[] {
  if (extent === undefined || extent.least.at === extent.greatest.at) return [];
  const { least, greatest } = extent;
  return [
    {
      text: `least ${plain(least.printed)} at ${least.at}, greatest ${plain(greatest.printed)} at ${greatest.at}`,
      style: 'dim',
    },
  ];
}

function expectationLines(expect: Expectation | undefined): ExplainedLine[] {
  return expect === undefined || expect.within
    ? []
    : [{ text: `△ outside of what is expected: ${expect.range}`, style: 'yellow' }];
}

function sharesText({ fractions }: GasBlock): string {
  return fractions.map(({ component, percent }) => `${component} ${percent} %`).join(', ');
}

function lookupText({ columns, rows }: LookupBlock): string {
  const heads = columns.map(({ name, unit }) => (unit === '' ? name : `${name} in ${unit}`));
  return `table of ${heads.join(', ')}: ${count(rows.length, 'row')}`;
}

function sourceLines({ source }: Block): ExplainedLine[] {
  return source === undefined ? [] : [{ text: `source: ${source}`, style: 'dim' }];
}
