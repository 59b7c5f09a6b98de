/** The cautions that every report carries, those that its own state calls for first. */
export function cautionsFor(state: { readonly holds: number; readonly failed: number }): readonly string[] {
  return [
    ...(state.failed > 0
      ? [`${count(state.failed, 'check')} of this sheet ${state.failed === 1 ? 'fails' : 'fail'}.`]
      : []),
    ...(state.holds > 0
      ? [`${count(state.holds, 'hold')} of this sheet ${state.holds === 1 ? 'is' : 'are'} open.`]
      : []),
    ...STANDING,
  ];
}

const STANDING = [
  'Never run a machine on a report with open holds or failed checks.',
  'These results support, and do not replace, the judgement of a licensed engineer.',
  'The adopted edition of each standard and the local codes govern; verify every limit against your edition.',
  'Each method holds within its stated range; where a range is left, the report carries a warning.',
];

function count(n: number, noun: string): string {
  return `${n} ${noun}${n === 1 ? '' : 's'}`;
}
