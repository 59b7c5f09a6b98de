import type { LocatedDiagnostic } from '../core/report/model.ts';
import type { Problem } from '../schemas/api.ts';

/** Every refusal that clients may rely on, with its status and its title. */
const REFUSALS = {
  'bad-request': [400, 'The request can’t be read'],
  'bad-body': [400, 'The body of the request is not what it should be'],
  'not-signed-in': [401, 'You are not signed in'],
  'wrong-password': [403, 'The e-mail or the password is wrong'],
  csrf: [403, 'The request does not come from this page'],
  'wrong-role': [403, 'Your roles in the study do not allow it'],
  'same-person': [403, 'Author, checker and approver must be three people'],
  'needs-browser': [403, 'This is done in the browser'],
  'not-found': [404, 'There is no such thing'],
  'wrong-state': [409, 'The revision is not in the state for it'],
  'holds-open': [409, 'Holds are open'],
  'blocks-unmarked': [409, 'Blocks are not marked'],
  'must-fix-open': [409, 'Must-fix remarks are not resolved'],
  'taken-unknown': [409, 'A value is taken from a revision that is not here'],
  'taken-differs': [409, 'A taken value is not the one on record'],
  unchanged: [409, 'Nothing has changed'],
  'digest-differs': [409, 'The block has another digest'],
  'not-approved': [409, 'The revision is not approved'],
  'changed-meanwhile': [412, 'It was changed meanwhile'],
  'too-large': [413, 'The request is too large'],
  'note-required': [422, 'A note is required'],
  'password-required': [422, 'Your password is required'],
  'bad-file-name': [422, 'The name of a file can’t be taken'],
  'bad-number': [422, 'The document number can’t be taken'],
  'bad-report': [422, 'The report is not a report'],
  'unknown-block': [422, 'The report has no such block'],
  'sheet-has-errors': [422, 'The sheet has errors'],
  'report-differs': [422, 'The report differs from the server’s own'],
  'evaluation-stopped': [422, 'The evaluation was stopped'],
  'precondition-required': [428, 'The request must say which version it changes'],
  'locked-out': [429, 'Too many failed attempts'],
  'too-many-requests': [429, 'Too many requests'],
  internal: [500, 'Something went wrong in the server'],
  busy: [503, 'The server is busy'],
} as const satisfies Readonly<Record<string, readonly [status: number, title: string]>>;

export type RefusalCode = keyof typeof REFUSALS;

export interface RefusalParts {
  readonly diagnostics?: readonly LocatedDiagnostic[];
  readonly differences?: Problem['differences'];
  /** Seconds after which it makes sense to try again. */
  readonly retryAfter?: number;
  /** In place of the code's own: a wrong password at sign-in is 401, one for a signature 403. */
  readonly status?: number;
}

/** A request that is refused, with the reason for the person who made it. Thrown by services, told by the error handler. */
export class Refusal extends Error {
  readonly code: RefusalCode;
  readonly status: number;
  readonly parts: RefusalParts;

  constructor(code: RefusalCode, detail: string, parts: RefusalParts = {}) {
    super(detail);
    this.name = 'Refusal';
    this.code = code;
    this.status = parts.status ?? REFUSALS[code][0];
    this.parts = parts;
  }

  toProblem(request: string): Problem {
    const { diagnostics, differences } = this.parts;
    return {
      type: `urn:antinode:problem:${this.code}`,
      title: REFUSALS[this.code][1],
      status: this.status,
      detail: this.message,
      code: this.code,
      request,
      ...(diagnostics === undefined ? {} : { diagnostics }),
      ...(differences === undefined ? {} : { differences }),
    };
  }
}

/** The same answer whether a thing does not exist or is not for this person to see. */
export function notFound(what: string): Refusal {
  return new Refusal('not-found', `there is no ${what}, or it is not for you to see`);
}
