import { isLogHead, sortableTime } from './claims.ts';
import { digestJson } from './digest.ts';
import { openJws } from './jws.ts';
import { logLeaf } from './log-leaf.ts';
import { verifyInclusion } from './merkle.ts';
import type { Bundle, LogEvent, LogHead, Manifest, Proof, PublicKey, SignatureRole } from './model.ts';
import { emailKey, signerOf } from './prove-people.ts';
import type { Signer } from './prove-signatures.ts';
import { invalid, judge, notAllowed, quote, unless, type Fault } from './verdict.ts';

type State = 'new' | 'pushed' | 'in check' | 'checked' | 'approved' | 'returned';

/** The life of a revision: state, event, next state. Anything else is no life that the rules know. */
const MOVES: readonly (readonly [from: State, event: string, to: State])[] = [
  ['new', 'pushed', 'pushed'],
  ['pushed', 'handed over', 'in check'],
  ['in check', 'checked', 'checked'],
  ['in check', 'returned', 'returned'],
  ['checked', 'approved', 'approved'],
  ['checked', 'returned', 'returned'],
  ['returned', 'handed over', 'in check'],
];

/** Events that only the signer in this role brings about; `signs` where the signature is given with it. */
const ACTORS: readonly { readonly event: string; readonly role: SignatureRole; readonly signs: boolean }[] = [
  { event: 'pushed', role: 'author', signs: false },
  { event: 'handed over', role: 'author', signs: true },
  { event: 'checked', role: 'checker', signs: true },
  { event: 'approved', role: 'approver', signs: true },
];

/** That the server's log holds the events of this revision, and that they tell the same story as the signatures. */
export async function proveLog(
  { log, manifest }: Bundle,
  serverKeys: ReadonlyMap<string, PublicKey>,
  signers: readonly Signer[],
): Promise<readonly Proof[]> {
  const head = await openHead(log.head, serverKeys);
  const digest = digestJson(manifest);
  const events = log.entries.map(({ event }) => event);
  return [
    proveHead(head),
    ...log.entries.map((entry) => proveEntry(entry, head, isAbout(entry.event, manifest, digest))),
    judge('Story of the revision', storyFaults(events), 'pushed, handed over, checked and approved'),
    judge('Log and signatures agree', actorFaults(events, signers), 'each event was brought about by its signer'),
    judge('Times in the log', timeFaults(events, head, signers), 'events follow each other, the head comes after them'),
  ];
}

async function openHead(jws: string, serverKeys: ReadonlyMap<string, PublicKey>): Promise<LogHead | Fault> {
  const opened = await openJws(jws, 'antinode-log-head+jws', serverKeys);
  if ('fault' in opened) return opened;
  return isLogHead(opened.payload) ? opened.payload : invalid('it does not say what a head of a log must say');
}

function proveHead(head: LogHead | Fault): Proof {
  if ('fault' in head) return judge('Head of the log', [head], '');
  return judge('Head of the log', [], `signed by the server at ${head.time}, ${head.size} entries`);
}

function proveEntry({ event, proof }: Bundle['log']['entries'][number], head: LogHead | Fault, about: boolean): Proof {
  return judge(
    `Log entry ${event.index}, ${quote(event.event)}`,
    [
      ...inclusionFaults(event, proof, head),
      ...unless(about, notAllowed('it is about another revision than this one')),
    ],
    `${quote(event.actor)} at ${quote(event.time)}, included in the log`,
  );
}

function isAbout(event: LogEvent, manifest: Manifest, digest: string): boolean {
  const { study, number, revision } = manifest;
  return event.manifest === digest && event.study === study && event.number === number && event.revision === revision;
}

function inclusionFaults(event: LogEvent, proof: readonly string[], head: LogHead | Fault): readonly Fault[] {
  if ('fault' in head) return [invalid('it has no good head of the log to be held against')];
  const { size, root } = head;
  const included = verifyInclusion({ leaf: logLeaf(event), index: event.index, size, proof, root });
  return unless(included, invalid('it is not in the log at its place'));
}

function storyFaults(events: readonly LogEvent[]): readonly Fault[] {
  let state: State = 'new';
  for (const { event } of events) {
    const move = MOVES.find(([from, name]) => from === state && name === event);
    if (!move) return [notAllowed(`${quote(event)} cannot follow where the revision is ${quote(state)}`)];
    state = move[2];
  }
  return unless(state === 'approved', notAllowed(`it ends with the revision ${quote(state)}, not approved`));
}

function actorFaults(events: readonly LogEvent[], signers: readonly Signer[]): readonly Fault[] {
  return ACTORS.flatMap(({ event, role }) => {
    const signer = signerOf(role, signers);
    const last = events.findLast((candidate) => candidate.event === event);
    if (!signer) return [notAllowed(`${quote(event)} has no good signature of the ${role}`)];
    if (!last) return [notAllowed(`the log has no event ${quote(event)} for the signature of the ${role}`)];
    const same = emailKey(last.actor) === emailKey(signer.email);
    return unless(same, notAllowed(`${quote(event)} was not brought about by the ${role} who signed`));
  });
}

function timeFaults(events: readonly LogEvent[], head: LogHead | Fault, signers: readonly Signer[]): readonly Fault[] {
  const times = [...events.map(({ time }) => time), ...('fault' in head ? [] : [head.time])].map(sortableTime);
  const rising = (values: readonly (string | number)[]): boolean =>
    values.every((value, index) => index === 0 || (values[index - 1] ?? value) <= value);
  const indices = events.map(({ index }) => index);
  const known = times.filter((time) => time !== null);
  return [
    ...unless(
      new Set(indices).size === indices.length && rising(indices),
      notAllowed('the entries are not in the order of the log'),
    ),
    ...unless(known.length === times.length, invalid('a time is not an ISO 8601 time in UTC')),
    ...unless(rising(known), notAllowed('a later entry has an earlier time')),
    ...ACTORS.filter(({ signs }) => signs).flatMap(({ event, role }) => lateFaults(event, role, events, signers)),
  ];
}

/** The log records a signature that has been given: the signature can't be younger than its event. */
function lateFaults(
  event: string,
  role: SignatureRole,
  events: readonly LogEvent[],
  signers: readonly Signer[],
): readonly Fault[] {
  const signed = sortableTime(signerOf(role, signers)?.time ?? '');
  const logged = sortableTime(events.findLast((candidate) => candidate.event === event)?.time ?? '');
  if (signed === null || logged === null) return [];
  return unless(signed <= logged, notAllowed(`the ${role} signed after the log says so`));
}
