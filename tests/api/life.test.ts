import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import { verifyBundle } from '../../core/seal/verify-bundle.ts';
import type { Move, RevisionDetail } from '../../schemas/api.ts';
import type { RunningServer } from '../../server/start.ts';
import { approvedBundle, castOf, detailOf, markAll, move, type Cast } from './life.ts';
import { AUTHOR, pushOf, READER, sheetText, signIn, startSite, STUDY } from './site.ts';

let server: RunningServer;
let cast: Cast;
beforeAll(async () => {
  server = await startSite();
  cast = await castOf(server);
});
afterAll(() => server.stop());

const push = (parts: Parameters<typeof sheetText>[0]) => cast.author.call('POST', STUDY, pushOf(sheetText(parts)));
const allowed = ({ may }: RevisionDetail): Move[] =>
  may.moves.filter((entry) => entry.allowed).map((entry) => entry.move);

describe('the life of a revision', () => {
  it('goes through the hands of three people to a bundle that holds, and breaks by one byte', async () => {
    const bundle = await approvedBundle(cast, { number: 'L-1' });
    const evaluate = (files: readonly { name: string; text: string }[], entry: string) =>
      evaluateSheet({ entry, files });
    const verification = await verifyBundle(bundle, evaluate);
    expect(verification.proofs.filter(({ holds }) => !holds)).toEqual([]);
    expect(verification.valid).toBe(true);
    expect(verification.signers.map(({ role, name }) => `${role} ${name}`)).toEqual([
      'author Maren Aldous',
      'checker Idris Kestrel',
      'approver Solveig Brandt',
    ]);
    for (let at = 7; at < bundle.length; at += Math.floor(bundle.length / 60)) {
      const other = bundle.charAt(at) === 'x' ? 'y' : 'x';
      const changed = await verifyBundle(bundle.slice(0, at) + other + bundle.slice(at + 1), evaluate);
      expect(changed.valid, `byte ${at}`).toBe(false);
    }
    const detail = await detailOf(cast.author, 'L-1/A');
    expect(detail.summary).toMatchObject({ state: 'approved', marks: { marked: 5, blocks: 5 } });
    expect(detail.events.map(({ event }) => event)).toEqual(
      expect.arrayContaining(['pushed', 'handed over', 'checked', 'approved']),
    );
    expect(allowed(detail)).toEqual([]);
  });

  it('says of every move who may make it, and refuses it to all others', async () => {
    await push({ number: 'L-2' });
    const refused = await move(cast.checker, 'L-2/A', 'hand over');
    expect(refused.status).toBeGreaterThanOrEqual(400);
    expect(allowed(await detailOf(cast.checker, 'L-2/A'))).toEqual([]);
    expect(allowed(await detailOf(cast.author, 'L-2/A'))).toEqual(['hand over']);
    expect((await move(cast.author, 'L-2/A', 'close check')).body).toMatchObject({ status: 403 });
    await move(cast.author, 'L-2/A', 'hand over');
    expect((await move(cast.author, 'L-2/A', 'hand over')).body).toMatchObject({ status: 409, code: 'wrong-state' });
    expect((await move(cast.approver, 'L-2/A', 'approve')).body).toMatchObject({ status: 409, code: 'wrong-state' });
    const reader = await signIn(server, READER);
    expect((await move(reader, 'L-2/A', 'return', 'no')).body).toMatchObject({ status: 403, code: 'wrong-role' });
    expect((await cast.author.call('GET', `${STUDY}/L-2/A/bundle`)).body).toMatchObject({
      status: 409,
      code: 'not-approved',
    });
  });

  it('asks for the password at every signature', async () => {
    await push({ number: 'L-3' });
    expect((await move(cast.author, 'L-3/A', 'hand over', '', 'wrong')).body).toMatchObject({
      status: 403,
      code: 'wrong-password',
    });
    const without = await cast.author.call('POST', `${STUDY}/L-3/A/transitions`, { move: 'hand over', note: '' });
    expect(without.body).toMatchObject({ status: 422, code: 'password-required' });
    expect((await detailOf(cast.author, 'L-3/A')).summary.state).toBe('pushed');
  });

  it('stops at an open hold, and goes on with a revision that closes it, keeping the marks of what has not changed', async () => {
    await push({ number: 'L-4', hold: 'Awaiting the vendor' });
    await move(cast.author, 'L-4/A', 'hand over');
    await markAll(cast.checker, 'L-4/A');
    await move(cast.checker, 'L-4/A', 'close check');
    expect((await move(cast.approver, 'L-4/A', 'approve')).body).toMatchObject({ status: 409, code: 'holds-open' });
    expect((await move(cast.approver, 'L-4/A', 'return')).body).toMatchObject({ status: 422, code: 'note-required' });
    expect((await move(cast.approver, 'L-4/A', 'return', 'Close the hold.')).status).toBe(200);
    await push({ number: 'L-4' });
    await move(cast.author, 'L-4/B', 'hand over');
    const { marks, summary } = await detailOf(cast.checker, 'L-4/B');
    expect(marks.map(({ path, keptFrom }) => [path, keptFrom])).toEqual([
      ['atmosphere', 'A'],
      ['inputs/A', 'A'],
    ]);
    expect(summary.marks).toEqual({ marked: 2, blocks: 5, kept: 2 });
  });

  it('wants a note where a check fails', async () => {
    await push({ number: 'L-5', limit: '1 lbf' });
    await move(cast.author, 'L-5/A', 'hand over');
    await markAll(cast.checker, 'L-5/A');
    await move(cast.checker, 'L-5/A', 'close check');
    expect((await move(cast.approver, 'L-5/A', 'approve')).body).toMatchObject({ status: 422, code: 'note-required' });
    expect((await move(cast.approver, 'L-5/A', 'approve', 'Accepted for start-up at reduced load.')).status).toBe(200);
  });
});

describe('marks', () => {
  it('are made by a checker, in check, on the block as it is', async () => {
    await push({ number: 'M-1' });
    const [block] = (await detailOf(cast.checker, 'M-1/A')).report.sections.flatMap(({ blocks }) => blocks);
    const mark = { path: block?.path, digest: block?.digest };
    expect((await cast.checker.call('PUT', `${STUDY}/M-1/A/marks`, mark)).body).toMatchObject({ code: 'wrong-state' });
    await move(cast.author, 'M-1/A', 'hand over');
    expect((await cast.author.call('PUT', `${STUDY}/M-1/A/marks`, mark)).status).toBe(403);
    const other = { ...mark, digest: `sha256-${'0'.repeat(64)}` };
    expect((await cast.checker.call('PUT', `${STUDY}/M-1/A/marks`, other)).body).toMatchObject({
      code: 'digest-differs',
    });
    expect((await cast.checker.call('PUT', `${STUDY}/M-1/A/marks`, mark)).body).toMatchObject({
      path: block?.path,
      keptFrom: null,
    });
    expect((await move(cast.checker, 'M-1/A', 'close check')).body).toMatchObject({ code: 'blocks-unmarked' });
    expect((await cast.checker.call('DELETE', `${STUDY}/M-1/A/marks?path=${block?.path}`)).status).toBe(204);
    expect((await detailOf(cast.checker, 'M-1/A')).marks).toEqual([]);
  });
});

describe('remarks', () => {
  it('are raised, answered and resolved; a must-fix one keeps the check open, and follows to the next revision', async () => {
    await push({ number: 'R-1' });
    await move(cast.author, 'R-1/A', 'hand over');
    await markAll(cast.checker, 'R-1/A');
    const remarks = `${STUDY}/R-1/A/remarks`;
    const raised = await cast.checker.call('POST', remarks, {
      path: 'inputs/p',
      weight: 'must fix',
      text: 'Which gauge?',
    });
    expect(raised.status).toBe(201);
    const id = String(raised.body['id']);
    expect((await move(cast.checker, 'R-1/A', 'close check')).body).toMatchObject({ code: 'must-fix-open' });

    const answered = await cast.author.call('POST', `${remarks}/${id}/replies`, { text: 'The one at the flange.' });
    expect(answered.body).toMatchObject({ state: 'answered', replies: [{ text: 'The one at the flange.' }] });
    const resolve = (etag: string | null) =>
      cast.checker.call(
        'PATCH',
        `${remarks}/${id}`,
        { state: 'resolved' },
        etag === null ? {} : { headers: { 'If-Match': etag } },
      );
    expect((await resolve(null)).body).toMatchObject({ status: 428 });
    expect((await resolve(raised.headers.get('etag'))).body).toMatchObject({ status: 412, code: 'changed-meanwhile' });
    expect(
      (await cast.author.call('PATCH', `${remarks}/${id}`, { state: 'resolved' }, { headers: { 'If-Match': '*' } }))
        .status,
    ).toBe(403);

    await push({ number: 'R-1', pressure: '905 psig' });
    expect((await detailOf(cast.checker, 'R-1/B')).remarks).toMatchObject([{ id, revision: 'A', state: 'answered' }]);
    const onB = `${STUDY}/R-1/B/remarks/${id}`;
    const resolved = await cast.checker.call(
      'PATCH',
      onB,
      { state: 'resolved' },
      { headers: { 'If-Match': answered.headers.get('etag') ?? '' } },
    );
    expect(resolved.body).toMatchObject({ state: 'resolved' });
  });

  it('are not raised by readers, nor on blocks that are not there', async () => {
    await push({ number: 'R-2' });
    const remark = { path: 'inputs/p', weight: 'question', text: 'Why?' };
    const reader = await signIn(server, READER);
    expect((await reader.call('POST', `${STUDY}/R-2/A/remarks`, remark)).body).toMatchObject({ code: 'wrong-role' });
    const nowhere = { ...remark, path: 'inputs/q' };
    expect((await cast.checker.call('POST', `${STUDY}/R-2/A/remarks`, nowhere)).body).toMatchObject({
      code: 'unknown-block',
    });
  });
});

describe('the desk', () => {
  it('tells each person what waits on them, and why', async () => {
    await push({ number: 'D-1' });
    const reasonOf = async (by: keyof Cast): Promise<string | undefined> => {
      const { waiting } = (await cast[by].call('GET', '/desk')).body as {
        waiting: { number: string; reason: string }[];
      };
      return waiting.find(({ number }) => number === 'D-1')?.reason;
    };
    expect(await reasonOf('author')).toContain('hand it over');
    expect(await reasonOf('checker')).toBeUndefined();
    await move(cast.author, 'D-1/A', 'hand over');
    expect(await reasonOf('author')).toBeUndefined();
    expect(await reasonOf('checker')).toBe('5 blocks to check');
    await markAll(cast.checker, 'D-1/A');
    expect(await reasonOf('checker')).toContain('close the check');
    await move(cast.checker, 'D-1/A', 'close check');
    expect(await reasonOf('approver')).toContain('approve or return');
  });

  it('shows the study with its people and its sheets', async () => {
    const { body } = await cast.author.call('GET', '/studies/th-3');
    expect(body).toMatchObject({ study: 'th-3', roles: ['engineer'] });
    expect(JSON.stringify(body['people'])).toContain(AUTHOR);
  });
});
