import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { api, getJson, sendJson, sendOnly, setCsrfToken } from '../../../web/lib/api-client.ts';
import { ApiProblem, hasCode, wordsOf } from '../../../web/lib/problem.ts';

const fetchMock = vi.fn<typeof fetch>();

beforeEach(() => {
  fetchMock.mockReset();
  vi.stubGlobal('fetch', fetchMock);
});
afterEach(() => vi.unstubAllGlobals());

function answer(status: number, body: unknown, type = 'application/problem+json'): void {
  fetchMock.mockResolvedValue(new Response(JSON.stringify(body), { status, headers: { 'Content-Type': type } }));
}

function sentHeaders(): Headers {
  return new Headers(fetchMock.mock.calls[0]?.[1]?.headers);
}

async function failureOf(promise: Promise<unknown>): Promise<unknown> {
  return promise.then(
    () => undefined,
    (error: unknown) => error,
  );
}

describe('api client', () => {
  it('escapes the parts of a path', () => {
    expect(api`/studies/${'a/b'}/sheets/${'TH3 C?'}`).toBe('/api/studies/a%2Fb/sheets/TH3%20C%3F');
  });

  it('sends the token of the session with changes, and with nothing else', async () => {
    setCsrfToken('token-1');
    answer(200, {});
    await sendJson('PATCH', '/api/x', { a: 1 }, '"etag"');
    expect(sentHeaders().get('X-CSRF-Token')).toBe('token-1');
    expect(sentHeaders().get('If-Match')).toBe('"etag"');
    expect(fetchMock.mock.calls[0]?.[1]?.body).toBe('{"a":1}');
    fetchMock.mockClear();
    answer(200, {});
    await getJson('/api/x');
    expect(sentHeaders().get('X-CSRF-Token')).toBeNull();
  });

  it('reads no body from an answer without content', async () => {
    fetchMock.mockResolvedValue(new Response(null, { status: 204 }));
    await expect(sendOnly('DELETE', '/api/x')).resolves.toBeUndefined();
  });

  it('throws the problem that the server tells, with its code and its words', async () => {
    answer(403, {
      title: 'Refused',
      status: 403,
      detail: 'You wrote this revision.',
      code: 'same-person',
      request: 'r-1',
      type: 'about:blank',
    });
    const error = await failureOf(getJson('/api/x'));
    expect(error).toBeInstanceOf(ApiProblem);
    expect(hasCode(error, 'same-person')).toBe(true);
    expect(hasCode(error, 'holds-open')).toBe(false);
    expect(wordsOf(error)).toBe('You wrote this revision.');
  });

  it('makes a problem of an answer that is none', async () => {
    fetchMock.mockResolvedValue(new Response('<h1>Bad gateway</h1>', { status: 502 }));
    const error = await failureOf(getJson('/api/x'));
    expect(error).toMatchObject({ status: 502, code: 'http-502', message: 'The server answered 502' });
  });

  it('says that the server is out of reach, and that nothing typed is lost', async () => {
    fetchMock.mockRejectedValue(new TypeError('failed to fetch'));
    const error = await failureOf(getJson('/api/x'));
    expect(hasCode(error, 'unreachable')).toBe(true);
    expect(wordsOf(error)).toContain('is kept');
  });
});
