import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { Push, Session } from '../../schemas/api.ts';
import { IN_MEMORY, type ServerConfig } from '../../server/config.ts';
import { DEMO_PASSWORD } from '../../server/seed/demo.ts';
import { startServer, type RunningServer, type StartOptions } from '../../server/start.ts';

export const AUTHOR = 'maren.aldous@tarnhollow.example';
export const CHECKER = 'idris.kestrel@tarnhollow.example';
export const APPROVER = 'solveig.brandt@tarnhollow.example';
export const READER = 'tomas.reyes@tarnhollow.example';
export { DEMO_PASSWORD as PASSWORD };

export function startSite(config: Partial<ServerConfig> = {}, options: StartOptions = {}): Promise<RunningServer> {
  const fixed = { data: IN_MEMORY, host: '127.0.0.1', port: 0, logLevel: 'silent', isDemo: true } as const;
  return startServer({ ...fixed, ...config }, options);
}

export interface Answer {
  readonly status: number;
  readonly headers: Headers;
  // Tests read answers as they come; their shape is what is tested.
  readonly body: Record<string, unknown>;
  readonly text: string;
}

export interface CallOptions {
  readonly headers?: Readonly<Record<string, string>>;
  /** Sent as it is, in place of JSON. */
  readonly raw?: string;
}

/** One who calls the API: a browser with its cookie and CSRF value, a token, or nobody. */
export interface Client {
  readonly call: (method: string, path: string, body?: unknown, options?: CallOptions) => Promise<Answer>;
}

export function clientOf({ url }: RunningServer, identity: Readonly<Record<string, string>> = {}): Client {
  return {
    call: async (method, path, body, { headers = {}, raw } = {}) => {
      const payload = raw ?? (body === undefined ? undefined : JSON.stringify(body));
      const response = await fetch(`${url}/api${path}`, {
        method,
        headers: { ...(payload === undefined ? {} : { 'Content-Type': 'application/json' }), ...identity, ...headers },
        ...(payload === undefined ? {} : { body: payload }),
      });
      const text = await response.text();
      return { status: response.status, headers: response.headers, body: parsed(text), text };
    },
  };
}

function parsed(text: string): Record<string, unknown> {
  try {
    return JSON.parse(text) as Record<string, unknown>;
  } catch {
    return {};
  }
}

export async function signIn(server: RunningServer, email: string): Promise<Client> {
  const answer = await clientOf(server).call('POST', '/session', { email, password: DEMO_PASSWORD });
  const { csrf } = answer.body as unknown as Session;
  const cookie = answer.headers.getSetCookie()[0]?.split(';')[0] ?? '';
  return clientOf(server, { Cookie: cookie, 'X-CSRF-Token': csrf });
}

export interface SheetParts {
  readonly number?: string;
  readonly pressure?: string;
  /** `hold` in place of a source. */
  readonly hold?: string;
  readonly limit?: string;
}

/** A small sheet: 5 blocks, one check. */
export function sheetText({ number = 'T-1', pressure = '900 psig', hold, limit = '60 lbf' }: SheetParts = {}): string {
  const origin = hold === undefined ? 'source: basis' : `hold: ${hold}`;
  return `antinode: sheet/1
number: ${number}
title: Force on a plate
units: us
atmosphere: 14.7 psia
sources: { basis: Design basis }
inputs:
  p: { value: ${pressure}, ${origin} }
  A: { value: 2 in^2, source: basis }
sections:
  - title: Force
    steps:
      F: 2 %*p*A to lbf
    checks:
      - { that: F <= ${limit}, label: Force below its limit }
`;
}

export function pushOf(text: string, entry = 'sheet.yaml'): Push {
  const files = [{ name: entry, text }];
  const { report, diagnostics } = evaluateSheet({ entry, files });
  if (report === null) throw new Error(JSON.stringify(diagnostics));
  return { entry, files, report };
}

export const STUDY = '/studies/th-3/sheets';
