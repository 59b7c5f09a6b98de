import { describe, expect, it } from 'vitest';
import { noteGroups } from '../../../web/features/revision/notes.ts';
import { evaluateText, reportOf, sheetOf } from '../../core/evaluate/sheet-text.ts';

const { sections } = reportOf(
  evaluateText(
    sheetOf(
      'inputs: { L: { value: 12 in, source: b, expect: 2..3 ft }, M: { value: 12 in, source: b, expect: 1..3 ft } }',
      'sections: [{ title: S, steps: { A: { calc: L*M, unit: in^2, expect: 1..5 in^2 } } }]',
    ),
  ),
);
const blocks = new Map(sections.flatMap((section) => section.blocks).map((block) => [block.path, block]));

describe('the margin', () => {
  it('asks why of every value outside of its expected range, and of no other', () => {
    expect(noteGroups(blocks, [], new Set()).map(({ path, asks }) => [path, asks])).toEqual([
      ['inputs/L', '12 in lies outside of 2..3 ft. Why?'],
      ['sections/1/steps/A', '144.0 in^2 lies outside of 1..5 in^2. Why?'],
    ]);
  });

  it('opens where a remark is being written', () => {
    const groups = noteGroups(blocks, [], new Set(['inputs/M']));
    expect(groups.find(({ path }) => path === 'inputs/M')).toMatchObject({ isComposing: true, asks: null });
  });
});
