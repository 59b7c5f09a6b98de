import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RunningServer } from '../../server/start.ts';
import { AUTHOR, CHECKER, clientOf, PASSWORD, signIn, startSite, type Answer, type Client } from './site.ts';

let server: RunningServer;
let now = Date.parse('2026-11-30T08:00:00Z');
let nobody: Client;
beforeAll(async () => {
  server = await startSite({}, { now: () => new Date(now) });
  nobody = clientOf(server);
});
afterAll(() => server.stop());

/** Every refusal is a problem document with all members, and gives away nothing of the server's inside. */
function expectProblem({ status, headers, body, text }: Answer, wanted: number, code: string): void {
  expect({ status, code: body['code'] }).toEqual({ status: wanted, code });
  expect(headers.get('content-type')).toMatch(/^application\/problem\+json/);
  expect(body).toMatchObject({ type: `urn:antinode:problem:${code}`, status: wanted });
  for (const member of ['title', 'detail', 'request']) expect(body[member]).toEqual(expect.any(String));
  expect(text).not.toMatch(/select |insert |\bat .+:\d+:\d+|node_modules/i);
}

describe('health', () => {
  it('answers without a sign-in', async () => {
    expect((await nobody.call('GET', '/health')).body).toMatchObject({
      status: 'ok',
      serverKey: server.serverKey,
    });
  });
});

describe('signing in', () => {
  it('gives a cookie that scripts and other sites do not get', async () => {
    const answer = await nobody.call('POST', '/session', { email: AUTHOR.toUpperCase(), password: PASSWORD });
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ person: { name: 'Maren Aldous', email: AUTHOR } });
    expect(answer.headers.getSetCookie()[0]).toMatch(/^antinode_session\w*=[^;]+;.*HttpOnly.*SameSite=Lax/i);
  });

  it('says the same of a wrong password and of an unknown address', async () => {
    const wrong = await nobody.call('POST', '/session', { email: CHECKER, password: 'no' });
    const unknown = await nobody.call('POST', '/session', { email: 'nobody@tarnhollow.example', password: 'no' });
    expectProblem(wrong, 401, 'wrong-password');
    expect({ ...unknown.body, request: '' }).toEqual({ ...wrong.body, request: '' });
  });

  it.each([CHECKER, 'someone@tarnhollow.example'])(
    'locks %s out after repeated failures, known or not',
    async (email) => {
      for (let i = 0; i < 5; i += 1) await nobody.call('POST', '/session', { email, password: `no ${i}` });
      const locked = await nobody.call('POST', '/session', { email, password: PASSWORD });
      expectProblem(locked, 429, 'locked-out');
      expect(Number(locked.headers.get('retry-after'))).toBeGreaterThan(0);
      now += 20 * 60 * 1000;
      const later = await nobody.call('POST', '/session', { email, password: PASSWORD });
      expect(later.status).toBe(email === CHECKER ? 200 : 401);
    },
  );

  it('ends with the sign-out, and after twelve idle hours', async () => {
    const client = await signIn(server, AUTHOR);
    expect((await client.call('GET', '/desk')).status).toBe(200);
    expect((await client.call('DELETE', '/session')).status).toBe(204);
    expectProblem(await client.call('GET', '/desk'), 401, 'not-signed-in');
    const idle = await signIn(server, AUTHOR);
    now += 13 * 60 * 60 * 1000;
    expectProblem(await idle.call('GET', '/desk'), 401, 'not-signed-in');
  });

  it('tells a page who is there, and nobody where nobody is', async () => {
    expect((await nobody.call('GET', '/session')).body).toMatchObject({ person: null });
    expect((await (await signIn(server, AUTHOR)).call('GET', '/session')).body).toMatchObject({
      person: { email: AUTHOR },
    });
  });
});

describe('forged requests', () => {
  it('are refused without the session’s own value, and from another origin', async () => {
    const client = await signIn(server, AUTHOR);
    const body = { label: 'x' };
    expectProblem(await client.call('POST', '/tokens', body, { headers: { 'X-CSRF-Token': '' } }), 403, 'csrf');
    expectProblem(await client.call('POST', '/tokens', body, { headers: { 'X-CSRF-Token': 'guess' } }), 403, 'csrf');
    expectProblem(
      await client.call('POST', '/tokens', body, { headers: { Origin: 'https://evil.example' } }),
      403,
      'csrf',
    );
    expect((await client.call('POST', '/tokens', body, { headers: { Origin: server.url } })).status).toBe(201);
  });

  it('cannot sign somebody in from another site', async () => {
    const signInBody = { email: AUTHOR, password: PASSWORD };
    expectProblem(
      await nobody.call('POST', '/session', signInBody, { headers: { Origin: 'https://evil.example' } }),
      403,
      'csrf',
    );
  });
});

describe('requests that cannot be served', () => {
  it('are answered as problems', async () => {
    const client = await signIn(server, AUTHOR);
    expectProblem(await nobody.call('GET', '/nowhere'), 404, 'not-found');
    expectProblem(await nobody.call('GET', '/desk'), 401, 'not-signed-in');
    expectProblem(await client.call('POST', '/tokens', undefined, { raw: '{"label":' }), 400, 'bad-body');
    const wrong = await client.call('POST', '/tokens', { label: 7 });
    expectProblem(wrong, 400, 'bad-body');
    expect(wrong.body['detail']).toContain('`label`');
    const extra = await client.call('POST', '/tokens', { label: 'x', admin: true });
    expect(extra.body['detail']).toContain('`admin`');
    const large = await client.call('POST', '/studies/th-3/sheets', undefined, {
      raw: `{"x":"${'y'.repeat(13_000_000)}"}`,
    });
    expectProblem(large, 413, 'too-large');
    expectProblem(await client.call('GET', '/studies/%E0%A4%A'), 404, 'not-found');
    expectProblem(await client.call('GET', "/studies/'; drop table people; --"), 404, 'not-found');
  });

  it('carry the headers that keep a page from doing more than it should', async () => {
    const { headers } = await nobody.call('GET', '/health');
    expect(headers.get('content-security-policy')).toContain("default-src 'self'");
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('cache-control')).toBe('no-store');
    expect(headers.get('x-powered-by')).toBeNull();
  });
});
