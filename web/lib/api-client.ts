import { problemOf, unreachable } from './problem.ts';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

interface RequestParts {
  readonly body?: unknown;
  readonly ifMatch?: string;
  readonly signal?: AbortSignal;
}

let csrfToken = '';

/** Remembers the token that the session gives; every request that changes something sends it back. */
export function setCsrfToken(token: string): void {
  csrfToken = token;
}

export async function getJson<T>(path: string, signal?: AbortSignal): Promise<T> {
  const response = await send('GET', path, signal === undefined ? {} : { signal });
  return (await response.json()) as T;
}

export async function getText(path: string, signal?: AbortSignal): Promise<string> {
  const response = await send('GET', path, signal === undefined ? {} : { signal });
  return response.text();
}

/** Sends a change, and reads the JSON that answers it. */
export async function sendJson<T>(method: Method, path: string, body: unknown, ifMatch?: string): Promise<T> {
  const response = await send(method, path, ifMatch === undefined ? { body } : { body, ifMatch });
  return (await response.json()) as T;
}

/** Sends a change that is answered by no content. */
export async function sendOnly(method: Method, path: string, body?: unknown): Promise<void> {
  await send(method, path, { body });
}

/** A path whose parts are escaped: `` api`/studies/${study}` ``. */
export function api(parts: TemplateStringsArray, ...values: readonly string[]): string {
  const path = parts.map((part, index) => (index === 0 ? part : encodeURIComponent(values[index - 1] ?? '') + part));
  return `/api${path.join('')}`;
}

async function send(method: Method, path: string, { body, ifMatch, signal }: RequestParts): Promise<Response> {
  const headers = new Headers({ Accept: 'application/json, application/problem+json' });
  if (method !== 'GET') headers.set('X-CSRF-Token', csrfToken);
  if (body !== undefined) headers.set('Content-Type', 'application/json');
  if (ifMatch !== undefined) headers.set('If-Match', ifMatch);
  const response = await fetch(path, {
    method,
    headers,
    credentials: 'same-origin',
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    ...(signal === undefined ? {} : { signal }),
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw unreachable();
  });
  if (!response.ok) throw await problemOf(response);
  return response;
}
