import { article } from '../units/dimensions.ts';
import type { AxisName } from '../axes/axis.ts';
import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { shapeOf } from '../expression/type-scope.ts';
import type { FigureNode } from '../sheet/document.ts';
import { compareTypes } from '../units/type-algebra.ts';
import type { TypedFigure } from './check-types.ts';

/** What each kind of figure runs along; a matrix takes any two axes, a line any one. */
const ALONG: ReadonlyMap<string, AxisName> = new Map([
  ['spectrum', 'harmonic'],
  ['wave', 'angle'],
  ['profile', 'place'],
]);

const KINDS = new Set(['line', 'spectrum', 'matrix', 'wave', 'profile']);

/** Most lines that stay apart to the eye; what varies further is brought down first. */
const MOST_AXES = 2;

/** Whether a figure can be drawn of what it shows, by the axes along which that varies. */
export function figureFaults(node: FigureNode, { of, limit }: TypedFigure): Diagnostic[] {
  const axes = shapeOf(of.typed);
  // Of a kind that does not exist, the schema has said so.
  const faults = KINDS.has(node.kind.text) ? axisFaults(node, axes) : [];
  const common = limit && compareTypes(of, limit);
  if (common !== undefined && 'fault' in common) {
    const { code, message, hints } = common.fault;
    faults.push(error(code, node.limit?.span ?? node.of.span, message, { hints }));
  }
  return faults;
}

function axisFaults(node: FigureNode, axes: readonly AxisName[]): Diagnostic[] {
  const { kind, of } = node;
  const report = (message: string, hint: string): Diagnostic[] => [
    error('FIGURE_AXES', of.span, message, { hints: [hint] }),
  ];
  const varies =
    axes.length === 0 ? 'it is a single value' : `it varies along ${axes.map((name) => `\`${name}\``).join(' and ')}`;
  const along = ALONG.get(kind.text);
  if (along !== undefined && !axes.includes(along))
    return report(`${article(kind.text)} runs along \`${along}\`, and this does not`, varies);
  if (kind.text === 'matrix' && axes.length !== 2) return report('a matrix shows a quantity over two axes', varies);
  if (axes.length === 0) return report(`${article(kind.text)} shows a quantity over an axis`, varies);
  if (axes.length > MOST_AXES)
    return report(
      'the quantity varies along more axes than a figure shows',
      `${varies}; bring one down: \`max_over(x, axis)\`, \`envelope(x)\`, \`at(x, axis, point)\``,
    );
  return [];
}
