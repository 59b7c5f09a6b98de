import type {
  Block,
  CheckBlock,
  ColumnBlock,
  FigureBlock,
  GasBlock,
  InputBlock,
  LookupBlock,
  Report,
  ReportAxis,
  ReportSection,
  StatementBlock,
  StepBlock,
  TableBlock,
  TakenBlock,
} from '../../core/report/model.ts';
import type { Paint } from '../terminal.ts';
import { harmless } from './harmless.ts';
import { count } from './print-diagnostics.ts';
import { gasLines, inputLines, lookupLines, proseLines, statementLines, takenLines } from './text/basis.ts';
import { conditionLines } from './text/conditions.ts';
import { figureLines, tableLines } from './text/figures.ts';
import { spaced, WIDTH, wrap } from './text/layout.ts';
import { checkLines, stepLines, utilisationText } from './text/working.ts';

/** The report as a terminal shows it: what is open first, then the sheet in its own order. */
export function reportText(written: Report, paint: Paint): string {
  const report = harmless(written);
  const lines = spaced([
    titleLines(report, paint),
    holdLines(report, paint),
    ...report.sections.map((section) => sectionLines(section, report.axes, paint)),
    summaryLines(report, paint),
    report.cautions.flatMap((line) => wrap(line, '', '  ').map((part) => paint('dim', part))),
  ]);
  return `${lines.join('\n')}\n`;
}

function titleLines({ sheet }: Report, paint: Paint): string[] {
  return [
    `${paint('bold', sheet.title)}`,
    paint('dim', `${sheet.number} · ${'─'.repeat(Math.max(0, WIDTH - sheet.number.length - 3))}`),
  ];
}

function holdLines({ holds }: Report, paint: Paint): string[] {
  return holds.map((hold) => `${paint(['yellow', 'bold'], '◔ hold')}  ${hold.label}: ${hold.reason}`);
}

/** Only the sheet's own sections have a number: it is the one in their paths. */
function sectionLines(section: ReportSection, axes: readonly ReportAxis[], paint: Paint): string[] {
  const number = /^sections\/(\d+)$/.exec(section.path)?.[1];
  const title = paint('bold', number === undefined ? section.title : `${number}  ${section.title}`);
  if (section.path === 'conditions') {
    const axis = axes.find(({ name }) => name === 'condition');
    return spaced([[title], conditionLines(section.blocks as readonly (InputBlock | ColumnBlock)[], axis, paint)]);
  }
  return spaced([[title], ...groups(section.blocks).map((blocks) => groupLines(blocks, paint))]);
}

/** Neighbouring blocks of one kind are set together, so that their columns line up. */
function groups(blocks: readonly Block[]): Block[][] {
  const found: Block[][] = [];
  for (const block of blocks) {
    const last = found.at(-1);
    if (last?.[0]?.block === block.block) last.push(block);
    else found.push([block]);
  }
  return found;
}

function groupLines(blocks: readonly Block[], paint: Paint): string[] {
  const first = blocks[0];
  switch (first?.block) {
    case 'input':
      return inputLines(blocks as readonly InputBlock[], paint);
    case 'taken':
      return takenLines(blocks as readonly TakenBlock[], paint);
    case 'gas':
      return gasLines(blocks as readonly GasBlock[], paint);
    case 'lookup':
      return lookupLines(blocks as readonly LookupBlock[], paint);
    case 'step':
      return stepLines(blocks as readonly StepBlock[], paint);
    case 'check':
      return checkLines(blocks as readonly CheckBlock[], paint);
    case 'table':
      return tableLines(blocks as readonly TableBlock[], paint);
    case 'figure':
      return figureLines(blocks as readonly FigureBlock[], paint);
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return statementLines(blocks as readonly StatementBlock[]);
    case 'text':
      return blocks.flatMap((block) => (block.block === 'text' ? proseLines(block.markdown) : []));
    case 'column':
      throw new Error('a column stands among the operating conditions');
    case undefined:
      return [];
  }
}

function summaryLines({ summary }: Report, paint: Paint): string[] {
  const { passed, failed, holds, governing } = summary;
  const checks = failed > 0 ? paint('red', `${count(failed, 'check')} of ${passed + failed} over`) : passWords(passed);
  const governs = governing === null ? [] : [governingText(governing)];
  const open = holds > 0 ? [paint('yellow', `${count(holds, 'hold')} open`)] : [];
  return [[checks, ...governs, ...open].join(' · ')];
}

function governingText(governing: NonNullable<Report['summary']['governing']>): string {
  const at = governing.at === undefined || governing.at === '' ? '' : ` at ${governing.at}`;
  return `governs ${utilisationText(governing)} ${governing.label}${at}`;
}

function passWords(passed: number): string {
  if (passed === 0) return 'no checks';
  return `${count(passed, 'check')} ${passed === 1 ? 'passes' : 'pass'}`;
}
