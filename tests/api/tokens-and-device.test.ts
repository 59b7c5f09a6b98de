import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunningServer } from '../../server/start.ts';
import { AUTHOR, clientOf, READER, signIn, startSite, STUDY, type Client } from './site.ts';

let server: RunningServer;
let now = Date.parse('2026-11-30T08:00:00Z');
let author: Client;
let nobody: Client;
beforeAll(async () => {
  server = await startSite({}, { now: () => new Date(now) });
  author = await signIn(server, AUTHOR);
  nobody = clientOf(server);
});
afterAll(() => server.stop());

const bearer = (token: unknown): Client => clientOf(server, { Authorization: `Bearer ${String(token)}` });

describe('personal tokens', () => {
  it('are shown once, used without CSRF, and gone when revoked', async () => {
    const created = await author.call('POST', '/tokens', { label: 'Script' });
    expect(created.status).toBe(201);
    const { token, id } = created.body as { token: string; id: string };
    expect(token).toMatch(/^antn_/);
    const listed = await author.call('GET', '/tokens');
    expect(listed.text).not.toContain(token);
    const script = bearer(token);
    expect((await script.call('GET', '/desk')).status).toBe(200);
    expect((await script.call('GET', '/session')).body).toMatchObject({ person: { email: AUTHOR } });
    expect((await author.call('DELETE', `/tokens/${id}`)).status).toBe(204);
    expect((await script.call('GET', '/desk')).body).toMatchObject({ status: 401, code: 'not-signed-in' });
  });

  it('cannot be used to make tokens, to approve a device, or to sign', async () => {
    const { token } = (await author.call('POST', '/tokens', { label: 'Script' })).body;
    const script = bearer(token);
    const moves = { move: 'hand over', note: '', password: 'antinode-demo' };
    for (const [path, body] of [
      ['/tokens', { label: 'More' }],
      [`${STUDY}/TH3-C-104/A/transitions`, moves],
      ['/device/ABCD-EFGH', { approve: true }],
    ] as const) {
      expect((await script.call('POST', path, body)).body).toMatchObject({ status: 403, code: 'needs-browser' });
    }
  });

  it('of another person cannot be revoked', async () => {
    const { id } = (await author.call('POST', '/tokens', { label: 'Mine' })).body;
    const other = await signIn(server, READER);
    expect((await other.call('DELETE', `/tokens/${String(id)}`)).status).toBe(404);
  });
});

describe('the device flow (RFC 8628)', () => {
  interface Grant {
    readonly device_code: string;
    readonly user_code: string;
    readonly interval: number;
    readonly verification_uri: string;
    readonly expires_in: number;
  }

  const begin = async (): Promise<Grant> =>
    (await nobody.call('POST', '/device/authorize', { client: 'antinode on a laptop' })).body as unknown as Grant;
  const poll = (grant: Grant) =>
    nobody.call('POST', '/device/token', {
      device_code: grant.device_code,
      grant_type: 'urn:ietf:params:oauth:grant-type:device_code',
    });
  const wait = (seconds: number): void => {
    now += seconds * 1000;
  };

  it('hands out a token once a person has approved the code', async () => {
    const grant = await begin();
    expect(grant.user_code).toMatch(/^[B-DF-HJ-NP-TV-Z]{4}-[B-DF-HJ-NP-TV-Z]{4}$/);
    expect(grant.verification_uri).toBe(`${server.url}/device`);
    expect((await poll(grant)).body).toEqual({ error: 'authorization_pending' });
    expect((await poll(grant)).body).toEqual({ error: 'slow_down' });
    expect((await author.call('GET', `/device/${grant.user_code}`)).body).toMatchObject({
      client: 'antinode on a laptop',
      state: 'waiting',
    });
    expect((await author.call('POST', `/device/${grant.user_code}`, { approve: true })).status).toBe(204);
    wait(grant.interval + 10);
    const granted = await poll(grant);
    expect(granted.body).toMatchObject({ token_type: 'Bearer', person: { email: AUTHOR } });
    expect((await bearer(granted.body['access_token']).call('GET', '/desk')).status).toBe(200);
    wait(60);
    expect((await poll(grant)).body).toEqual({ error: 'invalid_grant' });
  });

  it('tells a refusal, and a code that has expired', async () => {
    const refused = await begin();
    await author.call('POST', `/device/${refused.user_code}`, { approve: false });
    expect((await poll(refused)).body).toEqual({ error: 'access_denied' });
    const late = await begin();
    wait(late.expires_in + 1);
    expect((await poll(late)).body).toEqual({ error: 'expired_token' });
    expect((await author.call('POST', `/device/${late.user_code}`, { approve: true })).body).toMatchObject({
      code: 'wrong-state',
    });
  });

  it('needs a person who is signed in', async () => {
    const grant = await begin();
    expect((await nobody.call('POST', `/device/${grant.user_code}`, { approve: true })).status).toBe(401);
    expect((await author.call('GET', '/device/BBBB-BBBB')).status).toBe(404);
  });
});
