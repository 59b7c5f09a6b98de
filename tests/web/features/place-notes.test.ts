import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeNotes, type Note } from '../../../web/features/revision/place-notes.ts';

const GAP = 12;

function topsOf(notes: readonly Note[], pinned?: string): (number | undefined)[] {
  const tops = placeNotes(notes, { gap: GAP, pinned });
  return notes.map((note) => tops.get(note.id));
}

describe('placeNotes', () => {
  it('sets notes level with their blocks where there is room', () => {
    expect(
      topsOf([
        { id: 'a', anchor: 40, height: 60 },
        { id: 'b', anchor: 300, height: 60 },
      ]),
    ).toEqual([40, 300]);
  });

  it('shares the way between notes that would overlap', () => {
    // Both want 100; together they need 100 + 12, so each gives way by half of it.
    expect(
      topsOf([
        { id: 'a', anchor: 100, height: 100 },
        { id: 'b', anchor: 100, height: 50 },
      ]),
    ).toEqual([44, 156]);
  });

  it('keeps the pinned note level, and lets the others give way', () => {
    const [first = 0, second = 0] = topsOf(
      [
        { id: 'a', anchor: 100, height: 50 },
        { id: 'b', anchor: 110, height: 50 },
      ],
      'b',
    );
    expect(second).toBeCloseTo(110, 2);
    expect(first).toBeCloseTo(48, 2);
  });

  it('pushes down what would stand above the column', () => {
    expect(
      topsOf([
        { id: 'a', anchor: 0, height: 100 },
        { id: 'b', anchor: 0, height: 50 },
      ]),
    ).toEqual([0, 112]);
  });

  it('never lets notes overlap, leave their order or the column', () => {
    const note = fc.record({ anchor: fc.integer({ min: -50, max: 5000 }), height: fc.integer({ min: 1, max: 600 }) });
    fc.assert(
      fc.property(fc.array(note, { maxLength: 30 }), fc.nat(29), (drawn, pin) => {
        const notes = drawn.map((parts, index) => ({ ...parts, id: String(index) }));
        const tops = placeNotes(notes, { gap: GAP, pinned: String(pin) });
        let free = 0;
        for (const { id, height } of notes.toSorted((a, b) => a.anchor - b.anchor)) {
          const top = tops.get(id) ?? Number.NaN;
          expect(top).toBeGreaterThanOrEqual(free - 1e-6);
          free = top + height + GAP;
        }
      }),
    );
  });
});
