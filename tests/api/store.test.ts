import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openDatabase } from '../../server/db/open.ts';
import { readConfig } from '../../server/config.ts';
import { approvedBundle, castOf } from './life.ts';
import { AUTHOR, signIn, startSite, STUDY } from './site.ts';

let data: string;
beforeAll(async () => {
  data = await mkdtemp(join(tmpdir(), 'antinode-store-'));
});
afterAll(() => rm(data, { recursive: true }));

describe('a data folder', () => {
  it('is held by one server, and keeps what it was given over a restart', async () => {
    const first = await startSite({ data });
    await expect(startSite({ data })).rejects.toThrow(/in use by another/);
    await approvedBundle(await castOf(first), { number: 'S-1' });
    await first.stop();

    const second = await startSite({ data });
    const author = await signIn(second, AUTHOR);
    expect((await author.call('GET', `${STUDY}/S-1/A`)).body).toMatchObject({ summary: { state: 'approved' } });
    expect((await author.call('GET', `${STUDY}/S-1/A/bundle`)).status).toBe(200);
    await second.stop();
  });
});

/** The database itself refuses, by its triggers: SQLSTATE 23001. */
const RESTRICTED = { cause: { code: '23001' } };

describe('what is recorded', () => {
  it.each([
    "update revisions set title = 'another'",
    "update revisions set manifest = '{}'",
    "update revisions set state = 'pushed'",
    'delete from revisions',
    "update blobs set text = ''",
    'delete from blobs',
    "update signatures set jws = ''",
    'delete from signatures',
    "update events set note = 'x'",
    'delete from events',
    'truncate events cascade',
  ])('can be neither changed nor deleted, by whatever program: %s', async (statement) => {
    const { db, close } = await openDatabase({ data });
    await expect(db.execute(sql.raw(statement))).rejects.toMatchObject(RESTRICTED);
    await close();
  });

  it('is a log without gaps', async () => {
    const { db, close } = await openDatabase({ data });
    const found = await db.execute(sql`select index::int as index from events order by index`);
    const indexes = (found as { rows: { index: number }[] }).rows.map(({ index }) => index);
    expect(indexes).toEqual(indexes.map((_, i) => i));
    expect(indexes.length).toBeGreaterThanOrEqual(6);
    await close();
  });
});

describe('settings', () => {
  it('that are wrong are all named at once', () => {
    const env = {
      PORT: 'many',
      DATABASE_URL: 'mysql://x',
      PUBLIC_URL: 'ftp://x',
      LOG_LEVEL: 'loud',
      ANTINODE_MASTER_KEY: 'short',
    };
    for (const name of Object.keys(env)) expect(() => readConfig(env)).toThrow(name);
  });
});
