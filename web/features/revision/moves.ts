import type { Move } from '../../../schemas/api.ts';

interface MoveWords {
  readonly button: string;
  readonly title: string;
  readonly meaning: string;
  readonly confirm: string;
  /** What is said to all once it is done. */
  readonly done: string;
  readonly signsAs: 'author' | 'checker' | 'approver' | null;
  readonly note: { readonly label: string; readonly isRequired: boolean };
}

/** What each move is called, and what it means to make it. */
export const MOVES: Readonly<Record<Move, MoveWords>> = {
  'hand over': {
    button: 'Hand over',
    title: 'Hand this revision over for checking',
    meaning:
      'You sign as its author: the revision is complete as it stands, and ready to be checked. It can’t be changed any more; a correction is a new revision.',
    confirm: 'Sign and hand over',
    done: 'handed over for checking',
    signsAs: 'author',
    note: { label: 'Note to the checker', isRequired: false },
  },
  'close check': {
    button: 'Close the check',
    title: 'Close the check of this revision',
    meaning:
      'You sign as its checker: you have traced its inputs to their sources and its formulas to their references, and no must-fix remark is left open.',
    confirm: 'Sign and close the check',
    done: 'checked',
    signsAs: 'checker',
    note: { label: 'Note to the approver', isRequired: false },
  },
  approve: {
    button: 'Approve',
    title: 'Approve this revision',
    meaning:
      'You sign as its approver, over the same manifest that author and checker have signed: sources, report, counts of checks. Whoever holds the bundle can verify it, years from now and without this server.',
    confirm: 'Sign and approve',
    done: 'approved',
    signsAs: 'approver',
    note: { label: 'Note', isRequired: false },
  },
  return: {
    button: 'Return to author',
    title: 'Return this revision to its author',
    meaning:
      'Nothing is signed. The author answers by pushing a new revision; remarks that are not resolved follow to it, and marks stay on blocks that have not changed.',
    confirm: 'Return it',
    done: 'returned to the author',
    signsAs: null,
    note: { label: 'What is to be done', isRequired: true },
  },
};
