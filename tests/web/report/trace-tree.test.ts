import { describe, expect, it } from 'vitest';
import type { Block } from '../../../core/report/model.ts';
import { blocksByPath } from '../../../web/report/report-view.tsx';
import { traceOf, type TraceNode } from '../../../web/report/trace-tree.ts';
import { sampleReport } from '../fixtures/report.ts';

const blocks = blocksByPath(sampleReport());

function block(path: string): Block {
  const found = blocks.get(path);
  if (found === undefined) throw new Error(`the fixture has no block ${path}`);
  return found;
}

function outline(nodes: readonly TraceNode[]): unknown[] {
  return nodes.map(({ block: { path }, uses }) => (uses.length === 0 ? path : [path, ...outline(uses)]));
}

describe('traceOf', () => {
  it('goes back to inputs, in the order of the formula', () => {
    expect(outline(traceOf(block('sections/3/steps/F'), blocks))).toEqual([
      ['sections/3/steps/dp', 'inputs/dp_m', 'inputs/p_d', 'atmosphere'],
      ['sections/3/steps/A', 'sections/3/steps/D_i'],
    ]);
  });

  it('stops at the depth that it is given', () => {
    expect(outline(traceOf(block('sections/3/steps/F'), blocks, 1))).toEqual([
      'sections/3/steps/dp',
      'sections/3/steps/A',
    ]);
  });

  it('grows with the number of blocks, not with the number of ways between them', () => {
    // Each step reads the one before it twice over: 2^60 ways lead from the last to the first.
    const chain = new Map<string, Block>();
    const pattern = block('sections/3/steps/A');
    for (let index = 0; index < 60; index++) {
      for (const side of ['a', 'b']) {
        const uses = index === 0 ? [] : [`a${index - 1}`, `b${index - 1}`];
        chain.set(`${side}${index}`, { ...pattern, path: `${side}${index}`, uses } as Block);
      }
    }
    const last = chain.get('a59');
    const countNodes = (nodes: readonly TraceNode[]): number =>
      nodes.reduce((sum, node) => sum + 1 + countNodes(node.uses), 0);
    expect(last !== undefined && countNodes(traceOf(last, chain))).toBe(4 * 59 - 2);
  });
});
