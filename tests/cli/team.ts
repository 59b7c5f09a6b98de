import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { CreatedToken, Move, RevisionDetail, Session } from '../../schemas/api.ts';
import { loadServerKey } from '../../server/auth/server-key.ts';
import type { ServerConfig } from '../../server/config.ts';
import { openDatabase } from '../../server/db/open.ts';
import { makeEvaluatePool } from '../../server/evaluate/evaluate-pool.ts';
import { DEMO_PASSWORD, seedDemo } from '../../server/seed/demo.ts';
import type { Context } from '../../server/services/context.ts';
import { createPerson } from '../../server/services/people.ts';
import { addMember, createStudy } from '../../server/services/studies.ts';
import { startServer } from '../../server/start.ts';

export const AUTHOR = 'maren.aldous@tarnhollow.example';
export const CHECKER = 'idris.kestrel@tarnhollow.example';
export const APPROVER = 'solveig.brandt@tarnhollow.example';
export const READER = 'tomas.reyes@tarnhollow.example';
/** Engineer of both studies; the others are in the demo study alone. */
export const ENGINEER_OF_TWO = 'runa.falk@tarnhollow.example';

/** A person in a browser. */
export interface Browser {
  readonly request: (method: string, path: string, body?: unknown) => Promise<Response>;
  readonly json: <T>(method: string, path: string, body?: unknown) => Promise<T>;
}

export interface Team {
  readonly url: string;
  readonly signIn: (email: string) => Promise<Browser>;
  /** A token of the person, as the command line holds one. */
  readonly tokenOf: (email: string) => Promise<string>;
  readonly stop: () => Promise<void>;
}

/** A team server on the loopback address, with the demo study `th-3` and a second study `th-4`. */
export async function startTeam(): Promise<Team> {
  const data = await mkdtemp(join(tmpdir(), 'antinode-team-'));
  const config: ServerConfig = { data, host: '127.0.0.1', port: 0, logLevel: 'silent', isDemo: true };
  await seed(config);
  const server = await startServer(config);
  const signIn = (email: string): Promise<Browser> => openBrowser(server.url, email);
  return {
    url: server.url,
    signIn,
    tokenOf: async (email) => {
      const browser = await signIn(email);
      return (await browser.json<CreatedToken>('POST', '/tokens', { label: 'tests' })).token;
    },
    stop: async () => {
      await server.stop();
      await rm(data, { recursive: true });
    },
  };
}

async function seed(config: ServerConfig): Promise<void> {
  const { db, close } = await openDatabase(config);
  const pool = makeEvaluatePool();
  const serverKey = await loadServerKey(db, config);
  const context: Context = { db, pool, serverKey, isDemo: true, now: () => new Date(), address: () => '' };
  await seedDemo(context);
  await createStudy(context, { id: 'th-4', title: 'Tarn Hollow Station, unit TH-4', place: 'Tarn Hollow' });
  const runa = { name: 'Runa Falk', email: ENGINEER_OF_TWO, password: DEMO_PASSWORD, isDemo: true };
  const person = await createPerson(context, runa);
  for (const study of ['th-3', 'th-4']) await addMember(context, study, person, 'engineer');
  await pool.stop();
  await close();
}

async function openBrowser(url: string, email: string): Promise<Browser> {
  const answer = await send(`${url}/api/session`, 'POST', {}, { email, password: DEMO_PASSWORD });
  const { csrf } = (await answer.json()) as Session;
  const headers = { Cookie: answer.headers.getSetCookie().join('; ').split(';')[0] ?? '', 'X-CSRF-Token': csrf };
  const request: Browser['request'] = (method, path, body) => send(`${url}/api${path}`, method, headers, body);
  return {
    request,
    json: async <T>(...call: Parameters<typeof request>) => (await (await request(...call)).json()) as T,
  };
}

async function send(url: string, method: string, headers: Record<string, string>, body?: unknown): Promise<Response> {
  const sent = body === undefined ? {} : { body: JSON.stringify(body) };
  const response = await fetch(url, { method, headers: { ...headers, 'Content-Type': 'application/json' }, ...sent });
  if (!response.ok) throw new Error(`${method} ${url}: ${response.status} ${await response.text()}`);
  return response;
}

/** Takes a pushed revision of the demo study to its approval: every block marked, every move signed by its person. */
export async function approve({ signIn }: Team, number: string, revision: string): Promise<Uint8Array> {
  const path = `/studies/th-3/sheets/${number}/${revision}`;
  const [author, checker, approver] = [await signIn(AUTHOR), await signIn(CHECKER), await signIn(APPROVER)];
  const move = (browser: Browser, name: Move): Promise<RevisionDetail> =>
    browser.json('POST', `${path}/transitions`, { move: name, note: '', password: DEMO_PASSWORD });

  const { report } = await move(author, 'hand over');
  for (const { path: block, digest } of report.sections.flatMap((section) => section.blocks)) {
    await checker.request('PUT', `${path}/marks`, { path: block, digest });
  }
  await move(checker, 'close check');
  await move(approver, 'approve');
  return new Uint8Array(await (await approver.request('GET', `${path}/bundle`)).arrayBuffer());
}
