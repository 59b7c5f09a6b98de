import { execFileSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { chmod, mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import { verifyBundle } from '../../core/seal/verify-bundle.ts';
import { approvedBundle, castOf } from './life.ts';
import { AUTHOR, signIn, startSite, STUDY } from './site.ts';

/** Debian puts the server's programs into a folder for each major version. */
function postgresPrograms(): string | undefined {
  const root = '/usr/lib/postgresql';
  if (!existsSync(root)) return undefined;
  return readdirSync(root)
    .map((version) => join(root, version, 'bin'))
    .find((folder) => existsSync(join(folder, 'initdb')));
}

const programs = postgresPrograms();
const isRoot = process.getuid?.() === 0;

/** PostgreSQL refuses to run as root; its own user does it then. */
function asPostgres(program: string, args: string): void {
  const command = `${join(programs ?? '', program)} ${args}`;
  execFileSync(isRoot ? 'su' : 'sh', isRoot ? ['postgres', '-c', command] : ['-c', command], { stdio: 'pipe' });
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as AddressInfo;
      probe.close(() => resolve(port));
    });
  });
}

describe.skipIf(programs === undefined)('on a real PostgreSQL server (skipped where none is installed)', () => {
  let folder: string;
  let databaseUrl: string;
  let keys: string;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'antinode-postgres-'));
    keys = await mkdtemp(join(tmpdir(), 'antinode-keys-'));
    await chmod(folder, 0o777);
    const port = await freePort();
    const cluster = join(folder, 'cluster');
    asPostgres('initdb', `-D ${cluster} -A trust -U app -E UTF8 --locale=C.UTF-8 --no-sync`);
    asPostgres('pg_ctl', `-D ${cluster} -w -l ${join(folder, 'log')} -o '-h 127.0.0.1 -p ${port} -k ${folder}' start`);
    databaseUrl = `postgres://app@127.0.0.1:${port}/postgres`;
  });

  afterAll(async () => {
    asPostgres('pg_ctl', `-D ${join(folder, 'cluster')} -m immediate stop`);
    await rm(folder, { recursive: true, force: true });
    await rm(keys, { recursive: true, force: true });
  });

  it('the same migrations and the same life lead to the same kind of bundle', async () => {
    const server = await startSite({ databaseUrl, data: keys });
    const bundle = await approvedBundle(await castOf(server), { number: 'PG-1' });
    const verification = await verifyBundle(bundle, (files, entry) => evaluateSheet({ entry, files }));
    expect(verification.proofs.filter(({ holds }) => !holds)).toEqual([]);
    expect(verification.valid).toBe(true);
    await server.stop();
  });

  it('two servers may share the database', async () => {
    const [one, two] = await Promise.all([
      startSite({ databaseUrl, data: keys }),
      startSite({ databaseUrl, data: keys }),
    ]);
    const author = await signIn(two, AUTHOR);
    expect((await author.call('GET', `${STUDY}/PG-1/A`)).body).toMatchObject({ summary: { state: 'approved' } });
    await Promise.all([one.stop(), two.stop()]);
  });
});
