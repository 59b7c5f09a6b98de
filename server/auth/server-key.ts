import { randomBytes } from 'node:crypto';
import { mkdir, open, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { eq } from 'drizzle-orm';
import { publicKeyOf } from '../../core/seal/keys.ts';
import type { PublicKey, SigningKey } from '../../core/seal/model.ts';
import { IN_MEMORY, type ServerConfig } from '../config.ts';
import type { Database } from '../db/database.ts';
import { settings } from '../db/schema/settings.ts';
import { closeBox, openBox } from './seal-box.ts';
import { newSigningKey } from './signing-keys.ts';

export interface ServerKey {
  readonly signingKey: SigningKey;
  readonly publicKey: PublicKey;
}

const SETTING = 'server-key';
const PURPOSE = 'antinode server key';
const MASTER_KEY_FILE = 'master.key';

/** The key with which the server signs heads of its log and bundles: made once, kept encrypted under the master key. */
export async function loadServerKey(
  db: Database,
  config: Pick<ServerConfig, 'data' | 'masterKey'>,
): Promise<ServerKey> {
  const master = config.masterKey ?? (await masterKeyFile(config.data));
  const fresh = closeBox(JSON.stringify(await newSigningKey()), master, PURPOSE);
  // Of two servers that start on one database at once, one key stands, and both read it.
  await db.insert(settings).values({ name: SETTING, value: fresh }).onConflictDoNothing();
  const [row] = await db.select().from(settings).where(eq(settings.name, SETTING));
  const signingKey = openServerKey(row?.value ?? fresh, master);
  return { signingKey, publicKey: await publicKeyOf(signingKey) };
}

function openServerKey(box: string, master: Uint8Array): SigningKey {
  try {
    return JSON.parse(openBox(box, master, PURPOSE)) as SigningKey;
  } catch (cause) {
    throw new Error(
      `the server's key can't be opened: the master key (${MASTER_KEY_FILE} in the data folder, or ANTINODE_MASTER_KEY) is not the one it was closed with`,
      { cause },
    );
  }
}

/** The master key in the data folder, for nobody but the server's own user to read. */
async function masterKeyFile(data: string): Promise<Buffer> {
  if (data === IN_MEMORY) return randomBytes(32);
  await mkdir(data, { recursive: true, mode: 0o700 });
  const path = join(data, MASTER_KEY_FILE);
  const file = await open(path, 'wx', 0o600).catch((cause: NodeJS.ErrnoException) => {
    if (cause.code === 'EEXIST') return null;
    throw cause;
  });
  if (file !== null) {
    await file.writeFile(`${randomBytes(32).toString('hex')}\n`);
    await file.sync();
    await file.close();
  }
  const text = (await readFile(path, 'utf8')).trim();
  if (!/^[0-9a-f]{64}$/.test(text)) throw new Error(`${path} does not hold 64 hexadecimal digits`);
  return Buffer.from(text, 'hex');
}
