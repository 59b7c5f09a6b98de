import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RevisionSummary, StudyDetail } from '../../schemas/api.ts';
import { makeWorkplace, type CommandOptions, type Ended } from './harness.ts';
import { sheetText } from './sheets.ts';
import { approve, AUTHOR, ENGINEER_OF_TWO, READER, startTeam, type Team } from './team.ts';

/** Nothing listens there: the discard port is kept for other uses. */
const NOBODY = 'http://127.0.0.1:9';

const { cli, write, read, folder } = makeWorkplace();
let team: Team;

beforeAll(async () => {
  team = await startTeam();
}, 120_000);
afterAll(() => team.stop());

/** The environment of a person who is signed in by a token. */
async function as(email: string): Promise<CommandOptions> {
  return { env: { ANTINODE_SERVER: team.url, ANTINODE_TOKEN: await team.tokenOf(email) } };
}

/** Answers the sign-in that a command waits for, once it has said its code. */
function decide(email: string, isApproved: boolean): CommandOptions {
  let answered = false;
  const answer = async (code: string): Promise<void> => {
    const browser = await team.signIn(email);
    await browser.request('POST', `/device/${code}`, { approve: isApproved });
  };
  return {
    onErr: (sofar) => {
      const code = /approve the code (\S+)\./.exec(sofar)?.[1];
      if (code === undefined || answered) return;
      answered = true;
      void answer(code);
    },
  };
}

const CREDENTIALS = '.config/antinode/credentials.json';

interface Stored {
  readonly server: string;
  readonly token: string;
}

async function stored(): Promise<Stored> {
  return JSON.parse(await read(CREDENTIALS)) as Stored;
}

function isTokenGood({ server, token }: Stored): Promise<boolean> {
  return fetch(`${server}/api/desk`, { headers: { Authorization: `Bearer ${token}` } }).then(({ ok }) => ok);
}

describe('signing in and out', () => {
  it('login waits until the person approves in the browser', async () => {
    const { status, out, err } = await cli(['login', team.url], decide(AUTHOR, true));
    expect(err).toContain(`Open ${team.url}/device?code=`);
    expect({ status, out }).toEqual({ status: 0, out: `signed in as Maren Aldous <${AUTHOR}> at ${team.url}\n` });
    const { server, token } = await stored();
    expect(server).toBe(team.url);
    expect(token).toMatch(/^antn_/);
    expect(out + err).not.toContain(token);
  });

  it('keeps the sign-in where only the user may read it', async () => {
    expect((await stat(join(folder, CREDENTIALS))).mode & 0o777).toBe(0o600);
    expect((await stat(join(folder, '.config/antinode'))).mode & 0o777).toBe(0o700);
  });

  it('whoami says who is signed in, and where', async () => {
    expect(await cli(['whoami'])).toEqual({ status: 0, out: `Maren Aldous <${AUTHOR}> at ${team.url}\n`, err: '' });
    const { out } = await cli(['whoami', '--format', 'json']);
    expect(JSON.parse(out)).toMatchObject({ antinode: 'whoami/1', server: team.url, person: { email: AUTHOR } });
  });

  it('the environment wins over what is stored', async () => {
    const { out } = await cli(['whoami'], await as(READER));
    expect(out).toContain(READER);
    const elsewhere = await cli(['whoami'], { env: { ANTINODE_SERVER: NOBODY } });
    expect(elsewhere.status).toBe(4);
    expect(elsewhere.err).toContain(NOBODY);
  });

  it('logout revokes the token on the server, and forgets it here', async () => {
    const credentials = await stored();
    expect(await isTokenGood(credentials)).toBe(true);
    expect(await cli(['logout'])).toEqual({ status: 0, out: `signed out of ${team.url}\n`, err: '' });
    expect(await isTokenGood(credentials)).toBe(false);
    await expect(stat(join(folder, CREDENTIALS))).rejects.toThrow('ENOENT');
    expect(await cli(['logout'])).toEqual({ status: 0, out: '', err: 'you are not signed in\n' });
  });

  it('login ends when the person refuses in the browser', async () => {
    const { status, out, err } = await cli(['login', team.url], decide(AUTHOR, false));
    expect({ status, out }).toEqual({ status: 4, out: '' });
    expect(err).toContain('error: the sign-in was refused in the browser');
    await expect(stat(join(folder, CREDENTIALS))).rejects.toThrow('ENOENT');
  });

  it.each(['localhost:5181', 'ftp://127.0.0.1', 'nowhere'])('login refuses %s as an address', async (address) => {
    const { status, err } = await cli(['login', address]);
    expect(status).toBe(3);
    expect(err).toMatch(/is not the address of a server\n {2}= hint: write it as http:/);
  });
});

describe('without a sign-in, or without a server', () => {
  it.each([['whoami'], ['status'], ['push', 'sheet.yaml']])('%s asks to sign in', async (...args) => {
    await write('sheet.yaml', sheetText());
    const ended = await cli(args);
    expect(ended).toEqual({ status: 4, out: '', err: 'error: you are not signed in\n  = hint: antinode login\n' });
  });

  it.each([['whoami'], ['status'], ['push', 'sheet.yaml']])('%s says that the token is no good', async (...args) => {
    await write('sheet.yaml', sheetText());
    const { status, out, err } = await cli(args, { env: { ANTINODE_SERVER: team.url, ANTINODE_TOKEN: 'antn_stale' } });
    expect({ status, out }).toEqual({ status: 4, out: '' });
    expect(err).toContain('= hint: antinode login');
  });

  it.each([['login', NOBODY], ['whoami'], ['status'], ['push', 'sheet.yaml']])(
    '%s says that the server is out of reach',
    async (...args) => {
      await write('sheet.yaml', sheetText());
      const env = args[0] === 'login' ? {} : { ANTINODE_SERVER: NOBODY, ANTINODE_TOKEN: 'antn_any' };
      const { status, out, err } = await cli(args, { env });
      expect({ status, out }).toEqual({ status: 4, out: '' });
      expect(err).toContain(`error: the server ${NOBODY} is out of reach: `);
      expect(err).toContain('= hint: is it running? `antinode serve`');
    },
  );

  it('a damaged store of the sign-in counts as none', async () => {
    await write(CREDENTIALS, '{ "server": ');
    const { status, err } = await cli(['whoami']);
    expect(status).toBe(4);
    expect(err).toContain('= hint: antinode login');
    await cli(['logout']);
  });
});

describe('push', () => {
  const numbered = (number: string): string => sheetText().replace('T-001', number);

  it('pushes to the only study of the person', async () => {
    await write('push/first.yaml', numbered('TH3-C-201'));
    const { status, out, err } = await cli(['push', 'push/first.yaml'], await as(AUTHOR));
    expect({ status, out }).toEqual({ status: 0, out: 'TH3-C-201 revision A pushed to th-3\n' });
    expect(err).toBe(`Next: hand it over for checking at ${team.url}/studies/th-3/sheets/TH3-C-201/A\n`);
  });

  it('makes the next revision of a sheet that has changed, and refuses one that has not', async () => {
    const author = await as(AUTHOR);
    await write('push/again.yaml', numbered('TH3-C-202'));
    await cli(['push', 'push/again.yaml'], author);
    const unchanged = await cli(['push', 'push/again.yaml'], author);
    expect({ status: unchanged.status, out: unchanged.out }).toEqual({ status: 4, out: '' });
    expect(unchanged.err).toContain('= hint: nothing to push');
    await write('push/again.yaml', numbered('TH3-C-202').replace('60 psi', '55 psi'));
    const { out } = await cli(['push', 'push/again.yaml', '--format', 'json'], author);
    const answer = JSON.parse(out) as { antinode: string; revision: RevisionSummary };
    expect(answer).toMatchObject({ antinode: 'push/1', revision: { number: 'TH3-C-202', revision: 'B' } });
  });

  it('asks for the study only where there are several', async () => {
    const engineer = await as(ENGINEER_OF_TWO);
    await write('push/which.yaml', numbered('TH4-C-201'));
    const asked = await cli(['push', 'push/which.yaml'], engineer);
    expect({ status: asked.status, out: asked.out }).toEqual({ status: 3, out: '' });
    expect(asked.err).toContain('error: you are an engineer of several studies\n');
    expect(asked.err).toContain('= hint: --study th-3');
    expect(asked.err).toContain('= hint: --study th-4');
    const told = await cli(['push', 'push/which.yaml', '--study', 'th-4'], engineer);
    expect(told).toMatchObject({ status: 0, out: 'TH4-C-201 revision A pushed to th-4\n' });
  });

  it('is refused to who is an engineer of no study', async () => {
    const reader = await as(READER);
    await write('push/reader.yaml', numbered('TH3-C-203'));
    expect(await cli(['push', 'push/reader.yaml'], reader)).toMatchObject({ status: 3, out: '' });
    const { status, err } = await cli(['push', 'push/reader.yaml', '--study', 'th-3'], reader);
    expect(status).toBe(4);
    expect(err).toContain('= hint: ask the study for the role of an engineer');
  });

  it('says that there is no such study', async () => {
    await write('push/lost.yaml', numbered('TH3-C-204'));
    const { status, err } = await cli(['push', 'push/lost.yaml', '--study', 'th-9'], await as(AUTHOR));
    expect(status).toBe(4);
    expect(err).toMatch(/^error: .*study/);
  });

  it('sends no sheet that is wrong, and needs no server to say so', async () => {
    await write('push/wrong.yaml', sheetText({ steps: ['x: 2*nothing'] }));
    const wrong = await cli(['push', 'push/wrong.yaml'], { env: { ANTINODE_SERVER: NOBODY, ANTINODE_TOKEN: 'any' } });
    expect(wrong).toMatchObject({ status: 2, out: '' });
    expect(wrong.err).toContain('error[NAME_UNKNOWN]');
    const missing = await cli(['push', 'push/none.yaml']);
    expect(missing).toMatchObject({ status: 2, out: '' });
    expect(missing.err).toContain('error[FILE_NOT_FOUND]');
  });

  it('says what will stand in the way of an approval', async () => {
    const held = sheetText({ inputs: ['x: { value: 3 %, hold: Awaiting the vendor }'] });
    await write('push/held.yaml', held.replace('T-001', 'TH3-C-205').replace('2000 lbf', '1000 lbf'));
    const { status, err } = await cli(['push', 'push/held.yaml'], await as(AUTHOR));
    expect(status).toBe(0);
    expect(err).toContain("1 hold open: it can't be approved yet\n");
    expect(err).toContain('1 check of it over the limit\n');
  });
});

describe('status', () => {
  it('lists the newest revision of each sheet, and what it waits for', async () => {
    const { status, out, err } = await cli(['status', 'th-3'], await as(READER));
    expect({ status, err }).toEqual({ status: 0, err: '' });
    expect(out).toMatch(/^Tarn Hollow Station, unit TH-3 \(th-3\)\n/);
    expect(out).toMatch(/\n {2}TH3-C-104 {2}A {2}in check, waits on .*Second-stage discharge lateral.*1 hold open/);
  });

  it('covers all studies of the person', async () => {
    const { out } = await cli(['status', '--format', 'json'], await as(ENGINEER_OF_TWO));
    const { antinode, studies } = JSON.parse(out) as { antinode: string; studies: Pick<StudyDetail, 'study'>[] };
    expect(antinode).toBe('status/1');
    expect(studies.map(({ study }) => study)).toEqual(['th-3', 'th-4']);
  });

  it('is refused for a study in which the person is not', async () => {
    const { status, out } = await cli(['status', 'th-4'], await as(READER));
    expect({ status, out }).toEqual({ status: 4, out: '' });
  });
});

describe('serve', () => {
  it.each([
    { option: '--port', value: '99999', fault: 'PORT must be a whole number from 0 to 65535' },
    { option: '--host', value: 'no host', fault: 'HOST must be a host name or an address' },
  ])('refuses $option $value', async ({ option, value, fault }) => {
    const { status, out, err } = await cli(['serve', option, value]);
    expect({ status, out }).toEqual({ status: 3, out: '' });
    expect(err).toContain(fault);
  });

  it('says that its port is taken', async () => {
    const { port } = new URL(team.url);
    const { status, out, err } = await cli(['serve', '--data', join(folder, 'data'), '--port', port]);
    expect({ status, out }).toEqual({ status: 4, out: '' });
    expect(err).toBe(`error: the server can't start: port ${port} of 127.0.0.1 is taken by another program\n`);
  });
});

describe('verify', () => {
  let bundle: Uint8Array;

  beforeAll(async () => {
    await write('verify/sheet.yaml', sheetText().replace('T-001', 'TH3-C-301'));
    await cli(['push', 'verify/sheet.yaml'], await as(AUTHOR));
    bundle = await approve(team, 'TH3-C-301', 'A');
    await write('verify/good.bundle.json', bundle);
  });

  async function verifyAltered(from: string, to: string): Promise<Ended> {
    const text = new TextDecoder().decode(bundle);
    expect(text).toContain(from);
    await write('verify/altered.bundle.json', text.replace(from, to));
    return cli(['verify', 'verify/altered.bundle.json']);
  }

  it('accepts the bundle of an approved revision, offline', async () => {
    const { status, out, err } = await cli(['verify', 'verify/good.bundle.json']);
    expect({ status, err }).toEqual({ status: 0, err: '' });
    expect(out).toMatch(/\nvalid: TH3-C-301 revision A\n$/);
    expect(out).not.toContain('✗');
    for (const person of ['Maren Aldous', 'Idris Kestrel', 'Solveig Brandt']) expect(out).toContain(person);
  });

  it('says it for machines', async () => {
    const { out } = await cli(['verify', 'verify/good.bundle.json', '--format', 'json']);
    expect(JSON.parse(out)).toMatchObject({
      antinode: 'verification/1',
      valid: true,
      signers: [{ role: 'author' }, { role: 'checker' }, { role: 'approver' }],
    });
  });

  it('holds the server key against the one that the reader trusts', async () => {
    const { out } = await cli(['verify', 'verify/good.bundle.json', '--format', 'json']);
    const { serverKey } = JSON.parse(out) as { serverKey: string };
    expect((await cli(['verify', 'verify/good.bundle.json', '--key', serverKey])).status).toBe(0);
    const other = await cli(['verify', 'verify/good.bundle.json', '--key', 'another']);
    expect(other.status).toBe(1);
    expect(other.out).toMatch(/✗ .*key.*\n[^]*\nrefused: .*key/i);
  });

  it.each([
    { part: 'a value of the sheet', from: '60 psi', to: '61 psi' },
    { part: 'a label of the report', from: 'Force on the bore', to: 'Force on the bone' },
    { part: 'an address in the log', from: 'idris.kestrel@', to: 'idris.kestrol@' },
    { part: 'a time in the log', from: '"time":"2', to: '"time":"3' },
    { part: 'the white space', from: '{"antinode"', to: '{ "antinode"' },
  ])('refuses a bundle with $part changed by a byte, and says why', async ({ from, to }) => {
    const { status, out, err } = await verifyAltered(from, to);
    expect({ status, err }).toEqual({ status: 1, err: '' });
    expect(out).toMatch(/^✗ .+\n[^]*\nrefused: .{10,}\n$/m);
  });

  it('refuses a change of any signature, digest or key, at places all over the file', async () => {
    const places = Array.from({ length: 40 }, (_, i) => Math.floor(((i + 0.5) * bundle.length) / 40));
    for (const place of places) {
      const altered = Uint8Array.from(bundle);
      altered[place] = (altered[place] ?? 0) ^ 1;
      const { status, out } = await cli(['verify', '-'], { stdin: altered });
      // Where the change leaves no JSON, or another shape, it is no bundle any more.
      expect([1, 2]).toContain(status);
      expect(out).toMatch(/\nrefused: .{10,}\n$/);
    }
  });

  it.each([
    { file: 'text', content: 'not a bundle\n', reason: /it is not JSON/ },
    { file: 'other JSON', content: '{"antinode":"report/1"}', reason: /it has not the shape of a bundle/ },
    { file: 'empty file', content: '', reason: /it is not JSON/ },
  ])('is status 2 for what is no bundle: $file', async ({ content, reason }) => {
    await write('verify/other.json', content);
    const { status, out } = await cli(['verify', 'verify/other.json']);
    expect(status).toBe(2);
    expect(out).toMatch(reason);
  });

  it.each([
    { file: 'verify/none.json', reason: 'there is no such file' },
    { file: 'verify', reason: 'it is a folder' },
  ])('is status 2 for $file', async ({ file, reason }) => {
    const ended = await cli(['verify', file]);
    expect(ended).toEqual({ status: 2, out: '', err: `error: \`${file}\` cannot be read: ${reason}\n` });
  });

  it('reads the bundle from standard input for -', async () => {
    expect((await cli(['verify', '-'], { stdin: bundle })).status).toBe(0);
  });
});
