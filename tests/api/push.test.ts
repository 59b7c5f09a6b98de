import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Push, RevisionSummary } from '../../schemas/api.ts';
import type { RunningServer } from '../../server/start.ts';
import { AUTHOR, CHECKER, pushOf, READER, sheetText, signIn, startSite, STUDY, type Client } from './site.ts';

let server: RunningServer;
let author: Client;
beforeAll(async () => {
  server = await startSite({}, { pool: { seconds: 3 } });
  author = await signIn(server, AUTHOR);
});
afterAll(() => server.stop());

const push = (body: unknown, by: Client = author) => by.call('POST', STUDY, body);

describe('a push', () => {
  it('is evaluated again, and kept as the next revision', async () => {
    const answer = await push(pushOf(sheetText({ number: 'P-1' })));
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      number: 'P-1',
      revision: 'A',
      state: 'pushed',
      passed: 1,
      failed: 0,
      holds: 0,
    });
    const files = await author.call('GET', `${STUDY}/P-1/A/files/sheet.yaml`);
    expect(files.text).toBe(sheetText({ number: 'P-1' }));
  });

  it('takes the place of an unfinished revision, which goes back with the reason', async () => {
    await push(pushOf(sheetText({ number: 'P-2' })));
    const second = await push(pushOf(sheetText({ number: 'P-2', pressure: '910 psig' })));
    expect(second.body).toMatchObject({ revision: 'B', state: 'pushed' });
    const list = (await author.call('GET', `${STUDY}/P-2`)).body as unknown as RevisionSummary[];
    expect(list.map(({ revision, state }) => [revision, state])).toEqual([
      ['B', 'pushed'],
      ['A', 'returned'],
    ]);
  });

  it('of the same sources again is refused', async () => {
    const body = pushOf(sheetText({ number: 'P-3' }));
    await push(body);
    expect((await push(body)).body).toMatchObject({ status: 409, code: 'unchanged' });
  });
});

describe('a report that is not the server’s own', () => {
  const altered = (change: (report: Record<string, never>) => void): Push => {
    const body = structuredClone(pushOf(sheetText({ number: 'P-4' })));
    change(body.report as never);
    return body;
  };

  it.each([
    [
      'an SI value',
      'quantities/F',
      (report: never) => ((report as { quantities: { F: { si: number } } }).quantities.F.si *= 1.001),
    ],
    [
      'a printed digit',
      'sections/1/steps/F',
      (report: never) => {
        const { sections } = report as { sections: { blocks: { path: string; printed?: { number: string } }[] }[] };
        const block = sections.flatMap(({ blocks }) => blocks).find(({ path }) => path === 'sections/1/steps/F');
        if (block?.printed !== undefined) block.printed.number = '36.60';
      },
    ],
    [
      'a verdict',
      'checks',
      (report: never) =>
        ((report as { checks: { status: string }[] }).checks[0] = {
          ...(report as { checks: { status: string }[] }).checks[0],
          status: 'fail',
        }),
    ],
  ])('is refused, and %s is named', async (_, path, change) => {
    const answer = await push(altered(change as never));
    expect(answer.body).toMatchObject({ status: 422, code: 'report-differs' });
    expect(JSON.stringify(answer.body['differences'])).toContain(path);
  });

  it('may differ in the last bits', async () => {
    const body = altered((report) => {
      const { quantities } = report as unknown as { quantities: { F: { si: number; value: number } } };
      quantities.F.si *= 1 + 1e-13;
      quantities.F.value *= 1 - 1e-13;
    });
    expect((await push(body)).status).toBe(201);
  });

  it('of another shape is refused as such', async () => {
    const body = pushOf(sheetText({ number: 'P-5' }));
    expect((await push({ ...body, report: { antinode: 'report/1' } })).body).toMatchObject({
      status: 422,
      code: 'bad-report',
    });
  });
});

describe('refused pushes', () => {
  const body = pushOf(sheetText({ number: 'P-6' }));

  it('tell the faults of a sheet with their places', async () => {
    const text = sheetText({ number: 'P-6' }).replace('2 %*p*A', 'p + p');
    const answer = await push({ ...body, files: [{ name: 'sheet.yaml', text }] });
    expect(answer.body).toMatchObject({
      status: 422,
      code: 'sheet-has-errors',
      diagnostics: [{ code: 'LEVEL_SUM', file: 'sheet.yaml', line: 13, column: 10 }],
    });
  });

  it.each(['../sheet.yaml', 'a/../../b.yaml', '/etc/passwd', 'C:\\a.yaml', '', 'a\u0000b.yaml'])(
    'take no file named %j',
    async (name) => {
      const answer = await push({ ...body, entry: name, files: [{ name, text: sheetText({ number: 'P-6' }) }] });
      expect([400, 422]).toContain(answer.status);
    },
  );

  it('come from those who are no engineer of the study, or are no member', async () => {
    for (const email of [CHECKER, READER]) {
      expect((await push(body, await signIn(server, email))).body).toMatchObject({ status: 403, code: 'wrong-role' });
    }
    expect((await author.call('POST', '/studies/elsewhere/sheets', body)).body).toMatchObject({
      status: 404,
      code: 'not-found',
    });
  });

  it('leave the server running, whatever the sheet is', async () => {
    for (const text of [
      '['.repeat(100_000),
      `a: ${'&a '.repeat(5000)}`,
      '\u0000',
      sheetText().replace('2 %*p*A to lbf', `"${'('.repeat(1500)}1"`),
    ]) {
      const answer = await push({ ...body, files: [{ name: 'sheet.yaml', text }] });
      expect(['sheet-has-errors', 'bad-body']).toContain(answer.body['code']);
    }
    expect((await push(body)).status).toBe(201);
  });
});
