import { EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';
import { callApi } from '../remote/api.ts';
import { forgetCredentials, readCredentials } from '../remote/credentials.ts';

/** Revokes the token on the server, and forgets it here; out of reach of the server it is only forgotten here. */
export async function logout(at: Invocation): Promise<ExitStatus> {
  const credentials = await readCredentials(at);
  if (credentials === null) {
    at.streams.err('you are not signed in\n');
    return EXIT.done;
  }
  const answer = await callApi({ ...credentials, method: 'DELETE', path: '/tokens/current' }).catch(() => null);
  await forgetCredentials(at);
  at.streams.out(`signed out of ${credentials.server}\n`);
  if (answer === null)
    at.streams.err('the server is out of reach, so the token is still valid there until it is revoked\n');
  return EXIT.done;
}
