/**
 * Bodies of the team server's REST API, shared by server, web and command line.
 * Requests are checked against the JSON Schemas beside this file. Errors are RFC 9457 problem details.
 *
 *   GET    /api/health                                                    → Health
 *   GET    /api/session                                                   → Session
 *   POST   /api/session                             SignIn                → Session
 *   DELETE /api/session                                                   → 204
 *   GET    /api/tokens                                                    → AccessToken[]
 *   POST   /api/tokens                              NewToken              → CreatedToken
 *   DELETE /api/tokens/:id                                                → 204
 *   POST   /api/device/authorize                    DeviceRequest         → DeviceGrant          (RFC 8628)
 *   POST   /api/device/token                        DevicePoll            → DeviceToken | OAuthError
 *   GET    /api/device/:userCode                                          → DeviceInquiry
 *   POST   /api/device/:userCode                    DeviceDecision        → 204
 *   GET    /api/desk                                                      → Desk
 *   GET    /api/studies                                                   → StudySummary[]
 *   GET    /api/studies/:study                                            → StudyDetail
 *   POST   /api/studies/:study/sheets               Push                  → RevisionSummary (201)
 *   GET    /api/studies/:study/sheets/:number                             → RevisionSummary[] (newest first)
 *   GET    /api/studies/:study/sheets/:number/:revision                   → RevisionDetail
 *   GET    …/:revision/values                                             → RevisionValues
 *   POST   …/:revision/transitions                  Transition            → RevisionDetail
 *   PUT    …/:revision/marks                        MarkRequest           → Mark
 *   DELETE …/:revision/marks?path=…                                       → 204
 *   POST   …/:revision/remarks                      NewRemark             → Remark (201)
 *   POST   …/:revision/remarks/:id/replies          NewReply              → Remark
 *   PATCH  …/:revision/remarks/:id                  RemarkChange          → Remark   (If-Match: its ETag)
 *   GET    …/:revision/bundle                                             → the bundle file (application/json, attachment)
 *   GET    …/:revision/files/:name                                        → the source text
 *
 * Browser sessions: an httpOnly SameSite=Lax cookie; every request that changes something carries the header
 * `X-CSRF-Token` with the value of Session.csrf. Tokens: `Authorization: Bearer …`, no CSRF header.
 */
import type { LocatedDiagnostic, Quantity, Report } from '../core/report/model.ts';

export type Role = 'engineer' | 'checker' | 'approver' | 'reader';
export type State = 'pushed' | 'in check' | 'checked' | 'approved' | 'returned';
export type Move = 'hand over' | 'close check' | 'approve' | 'return';

export interface Health {
  readonly status: 'ok';
  readonly version: string;
  /** Id of the key with which the server seals bundles; published here, so that who verifies one can compare it. */
  readonly serverKey: string;
}

export interface Person {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

export interface Session {
  readonly person: Person | null;
  readonly csrf: string;
}

export interface SignIn {
  readonly email: string;
  readonly password: string;
}

export interface NewToken {
  readonly label: string;
}

export interface AccessToken {
  readonly id: string;
  readonly label: string;
  readonly created: string;
  readonly lastUsed: string | null;
}

export interface CreatedToken extends AccessToken {
  /** Shown once. */
  readonly token: string;
}

export interface DeviceRequest {
  readonly client: string;
}

export interface DeviceGrant {
  readonly device_code: string;
  readonly user_code: string;
  readonly verification_uri: string;
  readonly verification_uri_complete: string;
  readonly expires_in: number;
  readonly interval: number;
}

export interface DevicePoll {
  readonly device_code: string;
  readonly grant_type: 'urn:ietf:params:oauth:grant-type:device_code';
}

export interface DeviceToken {
  readonly access_token: string;
  readonly token_type: 'Bearer';
  readonly person: Person;
}

export interface OAuthError {
  readonly error: 'authorization_pending' | 'slow_down' | 'access_denied' | 'expired_token' | 'invalid_grant';
}

export interface DeviceInquiry {
  readonly client: string;
  readonly requested: string;
  readonly state: 'waiting' | 'approved' | 'refused' | 'expired';
}

export interface DeviceDecision {
  readonly approve: boolean;
}

/** One row of the desk: a revision that waits on the person, and why, in words. */
export interface DeskItem {
  readonly study: string;
  readonly studyTitle: string;
  readonly number: string;
  readonly title: string;
  readonly revision: string;
  readonly state: State;
  readonly reason: string;
  readonly since: string;
}

export interface Desk {
  readonly waiting: readonly DeskItem[];
  readonly studies: readonly StudySummary[];
}

export interface StudySummary {
  readonly study: string;
  readonly title: string;
  readonly place: string;
  readonly roles: readonly Role[];
  readonly sheets: number;
}

export interface StudyDetail {
  readonly study: string;
  readonly title: string;
  readonly place: string;
  readonly roles: readonly Role[];
  readonly people: readonly { readonly person: Person; readonly roles: readonly Role[] }[];
  /** Newest revision of each sheet, by number. */
  readonly sheets: readonly RevisionSummary[];
  /** Newest first, at most 30. */
  readonly activity: readonly RevisionEvent[];
}

export interface RevisionSummary {
  readonly study: string;
  readonly number: string;
  readonly title: string;
  readonly revision: string;
  readonly state: State;
  readonly author: Person;
  readonly pushed: string;
  readonly governing: Report['summary']['governing'];
  readonly passed: number;
  readonly failed: number;
  readonly holds: number;
  readonly remarks: { readonly open: number; readonly mustFix: number };
  readonly marks: { readonly marked: number; readonly blocks: number; readonly kept: number };
  /** Who it waits on, in words: "the author", "a checker". */
  readonly waitsOn: string;
  readonly manifest: string;
}

export interface RevisionEvent {
  readonly number: string;
  readonly revision: string;
  readonly event: 'pushed' | 'handed over' | 'checked' | 'approved' | 'returned';
  readonly person: Person;
  readonly time: string;
  readonly note: string;
}

export interface Mark {
  readonly path: string;
  readonly digest: string;
  readonly person: Person;
  readonly time: string;
  /** The earlier revision from which the mark is kept, because the block's digest has not changed. */
  readonly keptFrom: string | null;
}

export interface Remark {
  readonly id: string;
  readonly path: string;
  readonly weight: 'question' | 'should fix' | 'must fix';
  readonly text: string;
  readonly person: Person;
  readonly time: string;
  readonly state: 'open' | 'answered' | 'resolved';
  readonly replies: readonly { readonly person: Person; readonly time: string; readonly text: string }[];
  readonly etag: string;
  /** The revision on which the remark was raised (remarks that are not resolved follow to later revisions). */
  readonly revision: string;
}

export interface Signature {
  readonly role: 'author' | 'checker' | 'approver';
  readonly name: string;
  readonly email: string;
  readonly time: string;
  readonly meaning: string;
  readonly kid: string;
}

/** The values of a revision, for other sheets to take; `antinode pull` puts them into the lock file beside a sheet. */
export interface RevisionValues {
  readonly number: string;
  readonly revision: string;
  readonly state: State;
  readonly manifestDigest: string;
  /** The latest approved revision behind this one; null where there is none. */
  readonly newest: string | null;
  readonly quantities: Readonly<Record<string, Pick<Quantity, 'unit' | 'si' | 'axes'>>>;
}

export interface RevisionDetail {
  readonly summary: RevisionSummary;
  readonly report: Report;
  readonly marks: readonly Mark[];
  readonly remarks: readonly Remark[];
  readonly events: readonly RevisionEvent[];
  readonly signatures: readonly Signature[];
  readonly files: readonly string[];
  readonly revisions: readonly string[];
  /** What the signed-in person may do now; a move that is refused says why. */
  readonly may: {
    readonly mark: boolean;
    readonly remark: boolean;
    readonly resolve: boolean;
    readonly moves: readonly { readonly move: Move; readonly allowed: boolean; readonly why: string }[];
  };
}

export interface Push {
  readonly entry: string;
  readonly files: readonly { readonly name: string; readonly text: string }[];
  readonly report: Report;
}

export interface Transition {
  readonly move: Move;
  readonly note: string;
  /** The person's password, asked again for every move that signs (all but `return`). */
  readonly password?: string;
}

export interface MarkRequest {
  readonly path: string;
  readonly digest: string;
}

export interface NewRemark {
  readonly path: string;
  readonly weight: Remark['weight'];
  readonly text: string;
}

export interface NewReply {
  readonly text: string;
}

export interface RemarkChange {
  readonly state: 'open' | 'resolved';
}

/** RFC 9457, with our additions. */
export interface Problem {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  /** Stable code: `not-signed-in`, `wrong-password`, `report-differs`, `same-person`, `holds-open`, … */
  readonly code: string;
  readonly request: string;
  readonly diagnostics?: readonly LocatedDiagnostic[];
  /** For `report-differs`: the quantities or blocks that differ. */
  readonly differences?: readonly { readonly path: string; readonly yours: string; readonly ours: string }[];
}
