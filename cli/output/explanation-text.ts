import type { ExplainedBlock } from '../../core/report/explain.ts';
import type { Paint } from '../terminal.ts';
import { harmless } from './harmless.ts';
import { explainedLines, type ExplainedLine } from './text/explained-lines.ts';
import { shownWidth, WIDTH, wrap } from './text/layout.ts';

/** One result, and beneath it all that it rests on; branches show what belongs to what. */
export function explanationText(written: ExplainedBlock, paint: Paint): string {
  return `${nodeLines(harmless(written), '', '', paint).join('\n')}\n`;
}

/**
 * @param first     what stands before the first line of a block
 * @param following what stands before all its other lines, and those of the blocks beneath it
 */
function nodeLines(node: ExplainedBlock, first: string, following: string, paint: Paint): string[] {
  const stem = `${following}${node.uses.length > 0 ? '│  ' : '   '}`;
  const own = explainedLines(node).flatMap((line, i) => lineOnBranch(line, i === 0 ? first : stem, stem, paint));
  const beneath = node.uses.flatMap((used, i) => {
    const [fork, trunk] = i === node.uses.length - 1 ? ['└─ ', '   '] : ['├─ ', '│  '];
    return nodeLines(used, following + fork, following + trunk, paint);
  });
  return [...own, ...beneath];
}

/** Deep in the tree there is little room left; lines are then longer rather than narrow. */
const NARROWEST = 48;

function lineOnBranch({ text, style }: ExplainedLine, first: string, stem: string, paint: Paint): string[] {
  const width = Math.max(WIDTH, shownWidth(first) + NARROWEST);
  return wrap(text, first, `${stem}  `, width).map((line, i) => {
    const branch = i === 0 ? first : `${stem}  `;
    const words = line.slice(branch.length);
    return paint('dim', branch) + (style === undefined ? words : paint(style, words));
  });
}
