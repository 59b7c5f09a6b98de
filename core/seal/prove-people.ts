import { sortableTime } from './claims.ts';
import type { Proof, SignatureRole } from './model.ts';
import type { Signer } from './prove-signatures.ts';
import { judge, notAllowed, unless, type Fault } from './verdict.ts';

/** In the order in which they sign. */
const ROLES: readonly SignatureRole[] = ['author', 'checker', 'approver'];

/** That the revision was written, checked and approved by three people, in that order. */
export function provePeople(signers: readonly Signer[]): readonly Proof[] {
  return [
    judge(
      'All three have signed',
      ROLES.flatMap((role) => countFaults(role, signers)),
      'author, checker and approver',
    ),
    judge('Three different people', personFaults(signers), 'three e-mail addresses and three keys'),
    judge('Order of signing', orderFaults(signers), 'the author first, then the checker, then the approver'),
  ];
}

/** The form of an e-mail address by which people are told apart: spelling in capitals makes no second person. */
export function emailKey(email: string): string {
  return email.normalize('NFKC').trim().toLowerCase();
}

export function signerOf(role: SignatureRole, signers: readonly Signer[]): Signer | undefined {
  return signers.find((signer) => signer.role === role);
}

function countFaults(role: SignatureRole, signers: readonly Signer[]): readonly Fault[] {
  const count = signers.filter((signer) => signer.role === role).length;
  if (count === 0) return [notAllowed(`a good signature of the ${role} is missing`)];
  return unless(count === 1, notAllowed(`there are ${count} signatures of the ${role}`));
}

/** Counts distinct signers, not signatures: copies of one signature, or one person in two roles, are not enough. */
function personFaults(signers: readonly Signer[]): readonly Fault[] {
  const emails = new Set(signers.map(({ email }) => emailKey(email)));
  const keys = new Set(signers.map(({ kid }) => kid));
  return [
    ...unless(signers.length >= ROLES.length, notAllowed('there are fewer than three good signatures')),
    ...unless(emails.size === signers.length, notAllowed('one e-mail address signs in two places')),
    ...unless(keys.size === signers.length, notAllowed('one key signs in two places')),
  ];
}

function orderFaults(signers: readonly Signer[]): readonly Fault[] {
  const times = ROLES.map((role) => sortableTime(signerOf(role, signers)?.time ?? ''));
  return times.flatMap((time, index) => {
    const role = ROLES[index] ?? 'author';
    if (time === null) return [notAllowed(`the time of the ${role} is not known`)];
    const before = times[index - 1];
    return unless(
      !before || before <= time,
      notAllowed(`the ${role} signed before the ${ROLES[index - 1] ?? 'author'}`),
    );
  });
}
