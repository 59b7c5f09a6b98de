import { Refusal } from '../problem.ts';
import type { Standing } from './review.ts';

/** Why the person may not mark blocks of the revision; null where they may. */
export function refuseMark({ roles, isAuthor, state }: Standing): Refusal | null {
  if (!roles.includes('checker')) return new Refusal('wrong-role', 'only a checker of the study may mark blocks');
  if (isAuthor) return new Refusal('same-person', 'you wrote this revision; someone else must check it');
  if (state !== 'in check')
    return new Refusal('wrong-state', `the revision is ${state}, so its blocks can't be marked`);
  return null;
}
