import { hostname } from 'node:os';
import { setTimeout as wait } from 'node:timers/promises';
import type { DeviceGrant, DeviceToken, OAuthError } from '../../schemas/api.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';
import { callApi, requireApi } from '../remote/api.ts';
import { DEFAULT_SERVER, readCredentials, writeCredentials } from '../remote/credentials.ts';

/** Signs in by the device flow (RFC 8628): the person approves in the browser, the command waits for it. */
export async function login(server: string | undefined, at: Invocation): Promise<ExitStatus> {
  const address = await serverAddress(server, at);
  const body = { client: `antinode on ${hostname()}` };
  const grant = await requireApi<DeviceGrant>({ server: address, method: 'POST', path: '/device/authorize', body });
  at.streams.err(`Open ${at.paintErr('bold', grant.verification_uri_complete)}\n`);
  at.streams.err(`and approve the code ${at.paintErr('bold', grant.user_code)}. Waiting …\n`);
  const { access_token: token, person } = await poll(address, grant);
  await writeCredentials({ server: address, token }, at);
  at.streams.out(`signed in as ${person.name} <${person.email}> at ${address}\n`);
  return EXIT.done;
}

async function serverAddress(server: string | undefined, at: Invocation): Promise<string> {
  const given = server ?? at.env['ANTINODE_SERVER'] ?? (await readCredentials(at))?.server ?? DEFAULT_SERVER;
  if (!URL.canParse(given) || !/^https?:$/.test(new URL(given).protocol)) {
    throw new CommandFailure(EXIT.usage, `\`${given}\` is not the address of a server`, [
      `write it as ${DEFAULT_SERVER}`,
    ]);
  }
  return new URL(given).origin;
}

async function poll(server: string, grant: DeviceGrant): Promise<DeviceToken> {
  const body = { device_code: grant.device_code, grant_type: 'urn:ietf:params:oauth:grant-type:device_code' };
  for (let interval = grant.interval; ;) {
    await wait(interval * 1000);
    const answer = await callApi<DeviceToken>({ server, method: 'POST', path: '/device/token', body });
    if (answer.ok) return answer.value;
    const { error } = answer.problem as Partial<OAuthError>;
    if (error === 'slow_down') interval += 5;
    else if (error !== 'authorization_pending')
      throw new CommandFailure(EXIT.server, REASONS[error ?? 'invalid_grant']);
  }
}

const REASONS: Readonly<Record<OAuthError['error'], string>> = {
  authorization_pending: 'the sign-in waits for approval',
  slow_down: 'the server asks to wait longer',
  access_denied: 'the sign-in was refused in the browser',
  expired_token: 'the code has expired; sign in again',
  invalid_grant: 'the server does not know this sign-in; sign in again',
};
