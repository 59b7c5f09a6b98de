import type { State } from '../../schemas/api.ts';

const WORDS: Readonly<Record<State, { readonly glyph: string; readonly ink: string }>> = {
  pushed: { glyph: '○', ink: 'text-pencil' },
  'in check': { glyph: '◐', ink: 'text-copper' },
  checked: { glyph: '◕', ink: 'text-ink' },
  approved: { glyph: '●', ink: 'text-verdigris' },
  returned: { glyph: '↩', ink: 'text-madder' },
};

export function StateWord({ state }: { readonly state: State }) {
  const { glyph, ink } = WORDS[state];
  return (
    <span className={`font-medium whitespace-nowrap ${ink}`}>
      <span aria-hidden="true">{glyph}</span> {state}
    </span>
  );
}
