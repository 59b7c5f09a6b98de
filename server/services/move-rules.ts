import type { Move, Role, RevisionEvent, State } from '../../schemas/api.ts';
import type { SignatureRole } from '../../core/seal/model.ts';
import { Refusal } from '../problem.ts';
import { count, type Standing } from './review.ts';

interface Rule {
  readonly from: readonly State[];
  readonly to: State;
  readonly event: RevisionEvent['event'];
  /** What the mover signs as, and what the signature means; null where nothing is signed. */
  readonly signs: { readonly role: SignatureRole; readonly meaning: string } | null;
}

export const MOVES: Readonly<Record<Move, Rule>> = {
  'hand over': {
    from: ['pushed', 'returned'],
    to: 'in check',
    event: 'handed over',
    signs: { role: 'author', meaning: 'I wrote this revision; it is complete as it stands, and ready to be checked.' },
  },
  'close check': {
    from: ['in check'],
    to: 'checked',
    event: 'checked',
    signs: {
      role: 'checker',
      meaning: 'I have checked every block of this revision, and no must-fix remark is left open.',
    },
  },
  approve: {
    from: ['checked'],
    to: 'approved',
    event: 'approved',
    signs: { role: 'approver', meaning: 'I approve this revision.' },
  },
  return: { from: ['in check', 'checked'], to: 'returned', event: 'returned', signs: null },
};

/** Why the person may not make the move; null where they may. The note is not looked at: it is asked for with the move. */
export function whyNot(move: Move, standing: Standing): Refusal | null {
  return (
    refuseRole(move, standing) ??
    refusePerson(move, standing) ??
    refuseState(move, standing) ??
    refuseOpen(move, standing)
  );
}

/** The moves that the state knows and the person's roles allow, each with the reason where it is refused all the same. */
export function movesFor(standing: Standing): { move: Move; allowed: boolean; why: string }[] {
  const known = (Object.keys(MOVES) as Move[]).filter(
    (move) => MOVES[move].from.includes(standing.state) && standing.isNewest && !refuseRole(move, standing),
  );
  return known.map((move) => {
    const refusal = whyNot(move, standing);
    return { move, allowed: refusal === null, why: refusal?.message ?? '' };
  });
}

/** A return says what is to be done; an approval with failed checks says why. */
export function refuseWithoutNote(move: Move, { failed }: Standing, note: string): Refusal | null {
  if (note.trim() !== '') return null;
  if (move === 'return') return new Refusal('note-required', 'say in a note what is to be done');
  if (move !== 'approve' || failed === 0) return null;
  return new Refusal(
    'note-required',
    `${count(failed, 'check')} failed: say in a note why it is approved all the same`,
  );
}

function refuseRole(move: Move, standing: Standing): Refusal | null {
  const wanted = roleFor(move, standing.state);
  if (wanted === 'author') {
    return standing.isAuthor ? null : new Refusal('wrong-role', 'only its author may hand a revision over');
  }
  if (standing.roles.includes(wanted)) return null;
  return new Refusal(
    'wrong-role',
    `only ${wanted === 'approver' ? 'an' : 'a'} ${wanted} of the study may ${WORDS[move]}`,
  );
}

const WORDS: Readonly<Record<Move, string>> = {
  'hand over': 'hand it over',
  'close check': 'close the check',
  approve: 'approve it',
  return: 'return it',
};

function roleFor(move: Move, state: State): Extract<Role, 'checker' | 'approver'> | 'author' {
  if (move === 'hand over') return 'author';
  if (move === 'close check') return 'checker';
  return move === 'return' && state !== 'checked' ? 'checker' : 'approver';
}

function refusePerson(move: Move, { isAuthor, hasChecked }: Standing): Refusal | null {
  if (move === 'hand over') return null;
  if (isAuthor) return new Refusal('same-person', 'you wrote this revision; someone else must check and approve it');
  if (move === 'approve' && hasChecked) {
    return new Refusal('same-person', 'you checked this revision; someone else must approve it');
  }
  return null;
}

function refuseState(move: Move, { state, isNewest }: Standing): Refusal | null {
  if (!isNewest) return new Refusal('wrong-state', 'a later revision has replaced this one');
  if (MOVES[move].from.includes(state)) return null;
  return new Refusal('wrong-state', `the revision is ${state}, so you can't ${WORDS[move]}`);
}

function refuseOpen(move: Move, { unmarked, mustFix, holds }: Standing): Refusal | null {
  if (move === 'hand over' || move === 'return') return null;
  if (move === 'close check' && unmarked > 0) {
    return new Refusal('blocks-unmarked', `${count(unmarked, 'block')} ${unmarked === 1 ? 'is' : 'are'} not marked`);
  }
  if (mustFix > 0) {
    return new Refusal(
      'must-fix-open',
      `${count(mustFix, 'must-fix remark')} ${mustFix === 1 ? 'is' : 'are'} not resolved`,
    );
  }
  if (move === 'approve' && holds > 0) {
    return new Refusal('holds-open', `${count(holds, 'hold')} ${holds === 1 ? 'is' : 'are'} open`);
  }
  return null;
}
