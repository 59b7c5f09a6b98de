import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { CommandFailure, EXIT } from '../exit-status.ts';
import type { Surroundings } from '../terminal.ts';

export interface Credentials {
  readonly server: string;
  readonly token: string;
}

/** Where `serve` answers when nothing else is said. */
export const DEFAULT_SERVER = 'http://127.0.0.1:5181';

/** The stored sign-in, or that of ANTINODE_SERVER and ANTINODE_TOKEN, which win. */
export async function readCredentials(at: Surroundings): Promise<Credentials | null> {
  const { ANTINODE_TOKEN: token, ANTINODE_SERVER: server } = at.env;
  if (token !== undefined && token !== '') return { token, server: server ?? DEFAULT_SERVER };
  const stored = parseCredentials(await readFile(credentialsFile(at), 'utf8').catch(() => ''));
  return stored === null ? null : { ...stored, server: server ?? stored.server };
}

/** A file that is damaged counts as none: signing in writes it anew. */
function parseCredentials(text: string): Credentials | null {
  try {
    const { server, token } = JSON.parse(text) as Partial<Credentials>;
    return typeof server === 'string' && typeof token === 'string' ? { server, token } : null;
  } catch {
    return null;
  }
}

export async function requireCredentials(at: Surroundings): Promise<Credentials> {
  const credentials = await readCredentials(at);
  if (credentials !== null) return credentials;
  throw new CommandFailure(EXIT.server, 'you are not signed in', ['antinode login']);
}

/** Only the user may read it: whoever has the token can push in the user's name. */
export async function writeCredentials(credentials: Credentials, at: Surroundings): Promise<void> {
  const file = credentialsFile(at);
  await mkdir(dirname(file), { recursive: true, mode: 0o700 });
  await rm(file, { force: true });
  await writeFile(file, `${JSON.stringify(credentials, null, 2)}\n`, { mode: 0o600, flag: 'wx' });
}

export async function forgetCredentials(at: Surroundings): Promise<void> {
  await rm(credentialsFile(at), { force: true });
}

function credentialsFile({ env, cwd }: Surroundings): string {
  const config = env['XDG_CONFIG_HOME'] ?? join(env['HOME'] ?? cwd, '.config');
  return join(config, 'antinode', 'credentials.json');
}
