import type { CheckBlock } from '../../core/report/model.ts';

export type Standing = CheckBlock['standing'];

/** How a check stands, in a word and a sign; colour only repeats it. */
export const STANDINGS: Readonly<Record<Standing, { readonly glyph: string; readonly word: string }>> = {
  within: { glyph: '●', word: 'within' },
  close: { glyph: '◐', word: 'close' },
  over: { glyph: '▲', word: 'over' },
};

export const HOLD = { glyph: '◔', word: 'hold' } as const;

/** Standing of a utilisation where no check is at hand, as in contents and registers. */
export function standingOf(utilisation: number): Standing {
  if (utilisation > 1) return 'over';
  return utilisation >= 0.9 ? 'close' : 'within';
}

export function StandingWord({ standing }: { readonly standing: Standing }) {
  const { glyph, word } = STANDINGS[standing];
  return (
    <span className={`an-standing an-${standing}`}>
      <span aria-hidden="true">{glyph}</span> {word}
    </span>
  );
}

export function HoldWord() {
  return (
    <span className="an-standing an-hold">
      <span aria-hidden="true">{HOLD.glyph}</span> {HOLD.word}
    </span>
  );
}
