import type { CheckBlock, StepBlock } from '../../../core/report/model.ts';
import type { Paint } from '../../terminal.ts';
import { expectationDetail } from './basis.ts';
import {
  DETAIL_INDENT,
  type Detail,
  detailLines,
  extentDetail,
  fits,
  INDENT,
  noteLines,
  padEnd,
  plain,
  widest,
  wrap,
} from './layout.ts';

export const STANDING = {
  within: ['●', 'within', 'green'],
  close: ['◐', 'close', 'yellow'],
  over: ['▲', 'over', 'red'],
} as const;

/** Labels longer than this have a line to themselves: they would leave no room for the formulas. */
const LONGEST_LABEL = 36;

export function stepLines(blocks: readonly StepBlock[], paint: Paint): string[] {
  const width = widest(blocks.map(stepLabel).filter((label) => label.length <= LONGEST_LABEL));
  const margin = width === 0 ? INDENT : `${INDENT}${' '.repeat(width)}  `;
  return blocks.flatMap((block) => {
    const label = stepLabel(block);
    const isLong = label.length > LONGEST_LABEL;
    const lead = isLong || width === 0 ? margin : `${INDENT}${padEnd(label, width)}  `;
    const details = [...extentDetail(block.extent, paint), ...expectationDetail(block.expect, paint)];
    return [
      ...(isLong ? [INDENT + label] : []),
      ...formulaLines(block, lead, margin, paint),
      ...detailLines(details, (text) => text),
      ...noteLines(block, paint),
    ];
  });
}

/** A step without a label of its own is called by its name, which the formula says already. */
function stepLabel({ label, name }: StepBlock): string {
  return label === name ? '' : label;
}

/** Name, formula and result; where they are too long for a line, the result stands below, and a long formula is filled. */
function formulaLines(block: StepBlock, lead: string, margin: string, paint: Paint): string[] {
  const calc = withoutConversion(block.calc);
  const result = plain(block.printed);
  const start = `${lead}${block.name} = `;
  if (fits(`${start}${calc} = ${result}`)) return [`${start}${paint('dim', calc)} = ${paint('bold', result)}`];
  const indent = `${margin}  `;
  const [first = '', ...rest] = wrap(calc, start, `${indent}  `);
  return [
    start + paint('dim', first.slice(start.length)),
    ...rest.map((line) => paint('dim', line)),
    `${indent}= ${paint('bold', result)}`,
  ];
}

/** The result is shown in the unit that `to` asks for, which says it already. */
export function withoutConversion(calc: string): string {
  return calc.replace(/\s+to\s+\S+$/, '');
}

export function checkLines(blocks: readonly CheckBlock[], paint: Paint): string[] {
  const label = widest(blocks.map((block) => block.label));
  const that = widest(blocks.map((block) => block.that));
  return blocks.flatMap((block) => {
    const [glyph, word, colour] = STANDING[block.standing];
    const verdict = `${utilisationText(block)}  ${paint(colour, `${glyph} ${word}`)}`;
    const lead = `${INDENT}${padEnd(block.label, label)}  ${padEnd(block.that, that)}  `;
    const isShort = fits(`${lead}0.00  ${glyph} ${word}`);
    const lines = isShort ? [lead + verdict] : [INDENT + block.label, `${DETAIL_INDENT}${block.that}  ${verdict}`];
    return [...lines, ...detailLines(axisDetails(block, paint), (text) => text), ...noteLines(block, paint)];
  });
}

export function utilisationText({ utilisation }: { readonly utilisation: number | null }): string {
  return utilisation === null ? '   –' : utilisation.toFixed(2);
}

/** Of a check over axes: where it is worst, and at how many points it fails. */
export function axisDetails({ at, points }: CheckBlock, paint: Paint): Detail[] {
  if (points === undefined) return [];
  const governs = at === undefined || at === '' ? [] : [[paint('dim', `governs at ${at}`)]];
  const { all, failed } = points;
  return [...governs, ...(failed === 0 ? [] : [[paint('red', `fails at ${failed} of ${all}`)]])];
}
