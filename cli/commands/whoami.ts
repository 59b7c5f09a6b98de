import type { Session } from '../../schemas/api.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';
import { requireApi } from '../remote/api.ts';
import { requireCredentials } from '../remote/credentials.ts';

export async function whoami({ format }: { readonly format: 'text' | 'json' }, at: Invocation): Promise<ExitStatus> {
  const credentials = await requireCredentials(at);
  const { person } = await requireApi<Session>({ ...credentials, path: '/session' });
  if (person === null) throw new CommandFailure(EXIT.server, 'the sign-in is no longer valid', ['antinode login']);
  const { server } = credentials;
  at.streams.out(
    format === 'json'
      ? `${JSON.stringify({ antinode: 'whoami/1', server, person }, null, 2)}\n`
      : `${person.name} <${person.email}> at ${server}\n`,
  );
  return EXIT.done;
}
