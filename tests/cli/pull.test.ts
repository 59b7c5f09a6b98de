import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeWorkplace } from './harness.ts';
import { approve, AUTHOR, ENGINEER_OF_TWO, startTeam, type Team } from './team.ts';

const { cli, write, read } = makeWorkplace();
let team: Team;
let env: Record<string, string>;

const source = (pressure: string): string =>
  [
    'antinode: sheet/1',
    'number: T-1',
    'title: Source',
    'units: us',
    'atmosphere: 14.7 psia',
    'sources: { b: Basis }',
    `inputs: { p: { value: ${pressure}, source: b } }`,
    'sections: [{ title: S, steps: { d: p - 100 psig to psi } }]',
  ].join('\n');

const TAKER = [
  'antinode: sheet/1',
  'number: T-2',
  'title: Taker',
  'units: us',
  'take: { d_1: { from: T-1@A#d, label: Taken difference } }',
  'sections: [{ title: S, steps: { twice: 2*d_1 to psi } }]',
].join('\n');

beforeAll(async () => {
  team = await startTeam();
  env = { ANTINODE_SERVER: team.url, ANTINODE_TOKEN: await team.tokenOf(AUTHOR) };
  await write('source.yaml', source('150 psig'));
  await write('taker.yaml', TAKER);
  expect((await cli(['push', 'source.yaml'], { env })).status).toBe(0);
}, 60_000);

afterAll(() => team.stop());

describe('a sheet that takes a value', () => {
  it('says how to fetch it', async () => {
    const { status, err } = await cli(['run', 'taker.yaml']);
    expect(status).toBe(2);
    expect(err).toContain('fetch it: `antinode pull T-1@A`');
  });

  it('runs offline once it is pulled', async () => {
    const { status, out } = await cli(['pull', 'T-1@A'], { env });
    expect({ status, out }).toEqual({ status: 0, out: 'T-1@A (pushed): 2 values in antinode.lock.json\n' });
    const ran = await cli(['run', 'taker.yaml', '--format', 'json']);
    expect(ran.status).toBe(0);
    const { quantities } = JSON.parse(ran.out) as { quantities: Record<string, { value: number }> };
    expect(quantities['d_1']?.value).toBeCloseTo(50, 10);
    expect(quantities['twice']?.value).toBeCloseTo(100, 10);
  });

  it('is pushed with what it takes', async () => {
    expect(await cli(['push', 'taker.yaml'], { env })).toMatchObject({
      status: 0,
      out: 'T-2 revision A pushed to th-3\n',
    });
  });

  it('warns when a later revision is approved', async () => {
    await write('source.yaml', source('160 psig'));
    await cli(['push', 'source.yaml'], { env });
    await approve(team, 'T-1', 'B');
    const pulled = await cli(['pull', '--all', 'taker.yaml', '--format', 'json'], { env });
    expect(JSON.parse(pulled.out)).toMatchObject({ revisions: [{ number: 'T-1', revision: 'A', newest: 'B' }] });
    const ran = await cli(['run', 'taker.yaml']);
    expect(ran.status).toBe(0);
    expect(ran.err).toContain('warning[TAKE_STALE]: `T-1@A` is superseded: revision B is issued');
  });
});

describe('compare', () => {
  it('holds two revisions on the server against each other, and a file against one', async () => {
    const { status, out } = await cli(['compare', 'T-1@A', 'T-1@B', '--format', 'json'], { env });
    expect(status).toBe(0);
    expect(JSON.parse(out)).toMatchObject({ antinode: 'comparison/1', inputs: [{ path: 'inputs/p' }] });
    const same = await cli(['compare', 'T-1@B', 'source.yaml', '--format', 'json'], { env });
    expect(JSON.parse(same.out)).toMatchObject({ inputs: [], results: [] });
  });

  it('takes a file of that name before a revision', async () => {
    await write('T-1@A', source('150 psig'));
    expect((await cli(['compare', 'T-1@A', 'source.yaml'])).status).toBe(0);
  });
});

describe('pull', () => {
  it('keeps what the lock file holds besides', async () => {
    await cli(['pull', 'T-1@B'], { env });
    const { revisions } = JSON.parse(await read('antinode.lock.json')) as { revisions: object };
    expect(Object.keys(revisions)).toEqual(['T-1@A', 'T-1@B']);
  });

  it('writes the files of the revision into a new folder', async () => {
    const { status } = await cli(['pull', 'T-1@A', '--files', 'kept'], { env });
    expect(status).toBe(0);
    expect(await read('kept/source.yaml')).toBe(source('150 psig'));
    expect(JSON.parse(await read('kept/report.json'))).toMatchObject({ sheet: { number: 'T-1' } });
    expect((await cli(['pull', 'T-1@A', '--files', 'kept'], { env })).status).toBe(3);
  });

  it.each([
    [[], 3, 'say what to pull'],
    [['T-1'], 3, 'does not name a revision'],
    [['T-1@A', '--all', 'taker.yaml'], 3, 'say what to pull'],
    [['--all', 'source.yaml'], 3, 'takes nothing'],
    [['T-1@Z'], 4, 'no such revision'],
    [['T-9@A'], 4, 'no such sheet'],
  ])('%j ends with %d', async (args, status, said) => {
    const ended = await cli(['pull', ...args], { env });
    expect(ended.status).toBe(status);
    expect(ended.err).toContain(said);
  });

  it('asks for the study of who is in several', async () => {
    const of = { ...env, ANTINODE_TOKEN: await team.tokenOf(ENGINEER_OF_TWO) };
    const ended = await cli(['pull', 'T-1@A'], { env: of });
    expect(ended.status).toBe(3);
    expect(ended.err).toContain('--study th-3');
    expect((await cli(['pull', 'T-1@A', '--study', 'th-3'], { env: of })).status).toBe(0);
  });

  it('leaves a lock file alone that it cannot read', async () => {
    await write('odd/antinode.lock.json', '{}');
    expect((await cli(['pull', 'T-1@A', '--lock', 'odd'], { env })).status).toBe(3);
    expect(await read('odd/antinode.lock.json')).toBe('{}');
  });

  it('needs a sign-in', async () => {
    expect((await cli(['pull', 'T-1@A'])).status).toBe(4);
  });
});
