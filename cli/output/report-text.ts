import type {
  AssumptionBlock,
  Block,
  CheckBlock,
  GasBlock,
  InputBlock,
  Printed,
  Report,
  ReportSection,
  StepBlock,
} from '../../core/report/model.ts';
import { ATMOSPHERE_PATH } from '../../core/report/draft.ts';
import type { Paint } from '../terminal.ts';
import { harmless } from './harmless.ts';
import { count } from './print-diagnostics.ts';

const WIDTH = 88;
const STANDING = {
  within: ['●', 'within', 'green'],
  close: ['◐', 'close', 'yellow'],
  over: ['▲', 'over', 'red'],
} as const;

/** The report as a terminal shows it: what is open first, then the sheet in its own order. */
export function reportText(written: Report, paint: Paint): string {
  const report = harmless(written);
  const parts = [
    titleLines(report, paint),
    holdLines(report, paint),
    ...report.sections.map((section) => sectionLines(section, paint)),
    summaryLines(report, paint),
    report.cautions.map((line) => paint('dim', line)),
  ];
  return `${parts
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join('\n'))
    .join('\n\n')}\n`;
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
function sectionLines(section: ReportSection, paint: Paint): string[] {
  const number = /^sections\/(\d+)$/.exec(section.path)?.[1];
  const title = paint('bold', number === undefined ? section.title : `${number}  ${section.title}`);
  return [
    title,
    '',
    ...groups(section.blocks).flatMap((blocks, i) => [...(i > 0 ? [''] : []), ...groupLines(blocks, paint)]),
  ];
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
    case 'step':
      return stepLines(blocks as readonly StepBlock[], paint);
    case 'check':
      return checkLines(blocks as readonly CheckBlock[], paint);
    case 'gas':
      return (blocks as readonly GasBlock[]).flatMap((block) => gasLines(block, paint));
    case 'assumption':
      return (blocks as readonly AssumptionBlock[]).flatMap((block, i) => wrap(block.text, `   ${i + 1}. `));
    case 'text':
      return blocks.flatMap((block) => (block.block === 'text' ? proseLines(block.markdown) : []));
    case undefined:
      return [];
  }
}

function inputLines(blocks: readonly InputBlock[], paint: Paint): string[] {
  const label = widest(blocks.map((block) => block.label));
  const name = widest(blocks.map((block) => block.name));
  const value = widest(blocks.map(({ printed }) => plain(printed)));
  return blocks.flatMap((block) => {
    const origin = block.hold === undefined ? paint('dim', originOf(block)) : paint('yellow', '◔ hold');
    const line = `   ${block.label.padEnd(label)}  ${block.name.padEnd(name)}  ${plain(block.printed).padStart(value)}  ${origin}`;
    return [line.trimEnd(), ...noteLines(block, paint)];
  });
}

function originOf({ path, source }: InputBlock): string {
  return source ?? (path === ATMOSPHERE_PATH ? 'as this sheet states' : 'no source');
}

/** A step without a label of its own is called by its name, which the formula says already. */
function stepLabel({ label, name }: StepBlock): string {
  return label === name ? '' : label;
}

function stepLines(blocks: readonly StepBlock[], paint: Paint): string[] {
  const width = widest(blocks.map(stepLabel));
  const margin = width === 0 ? '   ' : `   ${' '.repeat(width)}  `;
  return blocks.flatMap((block) => {
    const calc = block.calc.replace(/\s+to\s+\S+$/, '');
    const formula = `${block.name} = ${paint('dim', calc)} = ${paint('bold', plain(block.printed))}`;
    const label = `   ${stepLabel(block).padEnd(width)}  `;
    return [`${label.slice(0, margin.length)}${formula}`, ...noteLines(block, paint)];
  });
}

function checkLines(blocks: readonly CheckBlock[], paint: Paint): string[] {
  const label = widest(blocks.map((block) => block.label));
  const that = widest(blocks.map((block) => block.that));
  return blocks.flatMap((block) => {
    const [glyph, word, colour] = STANDING[block.standing];
    const utilisation = block.utilisation === null ? '   –' : block.utilisation.toFixed(2);
    const line = `   ${block.label.padEnd(label)}  ${block.that.padEnd(that)}  ${utilisation}  ${paint(colour, `${glyph} ${word}`)}`;
    return [line, ...noteLines(block, paint)];
  });
}

function gasLines(block: GasBlock, paint: Paint): string[] {
  const fractions = block.fractions.map(({ component, percent }) => `${component} ${percent} %`).join(', ');
  return [...wrap(`${block.name} (${block.method}): ${fractions}`, '   '), ...noteLines(block, paint)];
}

function noteLines(block: Block, paint: Paint): string[] {
  return block.note === undefined ? [] : wrap(block.note, '      ').map((line) => paint('dim', line));
}

function summaryLines({ summary }: Report, paint: Paint): string[] {
  const { passed, failed, holds, governing } = summary;
  const checks = failed > 0 ? paint('red', `${count(failed, 'check')} of ${passed + failed} over`) : passWords(passed);
  const governs = governing === null ? [] : [`governs ${governing.utilisation.toFixed(2)} ${governing.label}`];
  const open = holds > 0 ? [paint('yellow', `${count(holds, 'hold')} open`)] : [];
  return [[checks, ...governs, ...open].join(' · ')];
}

function passWords(passed: number): string {
  if (passed === 0) return 'no checks';
  return `${count(passed, 'check')} ${passed === 1 ? 'passes' : 'pass'}`;
}

/** Prose as it was typed; each paragraph is filled anew. */
function proseLines(markdown: string): string[] {
  return markdown
    .trim()
    .split(/\n\s*\n/)
    .flatMap((paragraph, i) => [...(i > 0 ? [''] : []), ...wrap(paragraph.replace(/\s+/g, ' '), '   ')]);
}

function wrap(text: string, indent: string): string[] {
  const lines: string[] = [];
  let line = indent;
  for (const word of text.split(' ')) {
    if (line.trim() !== '' && line.length + word.length + 1 > WIDTH) {
      lines.push(line);
      line = ' '.repeat(indent.length);
    }
    line += line.endsWith(' ') || line === '' ? word : ` ${word}`;
  }
  return [...lines, line];
}

function plain({ number, unit }: Printed): string {
  return unit === '' ? number : `${number} ${unit}`;
}

function widest(texts: readonly string[]): number {
  return Math.max(0, ...texts.map((text) => text.length));
}
