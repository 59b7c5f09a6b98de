import type { Problem } from '../../schemas/api.ts';
import { CommandFailure, EXIT } from '../exit-status.ts';

export interface ApiCall {
  readonly server: string;
  readonly token?: string;
  readonly method?: 'GET' | 'POST' | 'DELETE';
  readonly path: string;
  readonly body?: unknown;
}

export type ApiAnswer<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly status: number; readonly problem: Partial<Problem> };

/** One request to the team server. A server that does not answer is a failure of the command. */
export async function callApi<T>(call: ApiCall): Promise<ApiAnswer<T>> {
  const response = await send(call);
  const text = await response.text();
  const value = parse(text);
  if (response.ok) return { ok: true, value: value as T };
  return { ok: false, status: response.status, problem: value ?? { detail: text.slice(0, 200) } };
}

/** As {@link callApi}, for commands that can do nothing with a refusal but tell it. */
export async function requireApi<T>(call: ApiCall): Promise<T> {
  const answer = await callApi<T>(call);
  if (answer.ok) return answer.value;
  throw refusalFailure(answer.status, answer.problem);
}

/** As {@link requireApi}, for what is no JSON. */
export async function requireText(call: ApiCall): Promise<string> {
  const response = await send(call);
  const text = await response.text();
  if (response.ok) return text;
  throw refusalFailure(response.status, parse(text) ?? { detail: text.slice(0, 200) });
}

export function refusalFailure(status: number, problem: Partial<Problem>): CommandFailure {
  const { title = `the server answered ${status}`, detail, code, request } = problem;
  const hints = HINTS[code ?? ''] ?? (status >= 500 && request !== undefined ? [`request id ${request}`] : []);
  return new CommandFailure(EXIT.server, detail === undefined ? title : `${title}: ${detail}`, hints);
}

const HINTS: Readonly<Record<string, readonly string[]>> = {
  'not-signed-in': ['antinode login'],
  'report-differs': ['run the same version of Antinode as the server, and push again'],
  'wrong-role': ['ask the study for the role of an engineer'],
  unchanged: ['nothing to push: the sheet is the one on the server'],
};

async function send({ server, token, method = 'GET', path, body }: ApiCall): Promise<Response> {
  const headers: Record<string, string> = { Accept: 'application/json' };
  if (token !== undefined) headers['Authorization'] = `Bearer ${token}`;
  if (body !== undefined) headers['Content-Type'] = 'application/json';
  try {
    return await fetch(`${server}/api${path}`, {
      method,
      headers,
      redirect: 'error',
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
  } catch (cause) {
    const reason = cause instanceof Error && cause.cause instanceof Error ? cause.cause.message : String(cause);
    throw new CommandFailure(EXIT.server, `the server ${server} is out of reach: ${reason}`, [
      'is it running? `antinode serve`',
    ]);
  }
}

function parse(text: string): unknown {
  try {
    return text === '' ? null : JSON.parse(text);
  } catch {
    return null;
  }
}
