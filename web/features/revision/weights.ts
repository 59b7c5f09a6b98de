import type { Remark } from '../../../schemas/api.ts';

type Weight = Remark['weight'];

export const WEIGHTS: readonly Weight[] = ['question', 'should fix', 'must fix'];

/** How a weight is drawn: a sign beside its word, ink, and the rule on top of the note. */
export const WEIGHT_LOOKS: Readonly<
  Record<Weight, { readonly glyph: string; readonly ink: string; readonly rule: string }>
> = {
  question: { glyph: '?', ink: 'text-slate', rule: 'border-slate' },
  'should fix': { glyph: '◇', ink: 'text-ochre-ink', rule: 'border-ochre' },
  'must fix': { glyph: '◆', ink: 'text-madder', rule: 'border-madder' },
};
