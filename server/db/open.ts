import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { PGlite } from '@electric-sql/pglite';
import { drizzle as drizzlePostgres } from 'drizzle-orm/node-postgres';
import { migrate as migratePostgres } from 'drizzle-orm/node-postgres/migrator';
import { drizzle as drizzlePglite } from 'drizzle-orm/pglite';
import { migrate as migratePglite } from 'drizzle-orm/pglite/migrator';
import pg from 'pg';
import { IN_MEMORY, type ServerConfig } from '../config.ts';
import { MIGRATIONS } from '../places.ts';
import { schema, type OpenDatabase } from './database.ts';
import { lockFolder } from './folder-lock.ts';

const DRIZZLE = { schema, casing: 'snake_case' } as const;
const MIGRATE = { migrationsFolder: MIGRATIONS };

/** Any number, the same on every server: migrations of one database run one at a time. */
const MIGRATION_LOCK = 5_181_001;

/** Opens the database, brings its tables up to date, and holds the data folder until it is closed. */
export function openDatabase({ databaseUrl, data }: Pick<ServerConfig, 'databaseUrl' | 'data'>): Promise<OpenDatabase> {
  if (databaseUrl !== undefined) return openPostgres(databaseUrl);
  return data === IN_MEMORY ? openPglite(undefined) : openFolder(data);
}

async function openFolder(data: string): Promise<OpenDatabase> {
  // PGlite makes its own folder, but not the parents of it.
  await mkdir(data, { recursive: true, mode: 0o700 });
  const unlock = await lockFolder(data);
  try {
    const { db, close } = await openPglite(join(data, 'pglite'));
    return { db, close: () => close().finally(unlock) };
  } catch (cause) {
    await unlock();
    throw cause;
  }
}

async function openPglite(folder: string | undefined): Promise<OpenDatabase> {
  const client = await PGlite.create(folder === undefined ? {} : { dataDir: folder });
  const db = drizzlePglite({ client, ...DRIZZLE });
  await migratePglite(db, MIGRATE);
  return { db, close: () => client.close() };
}

async function openPostgres(connectionString: string): Promise<OpenDatabase> {
  const pool = new pg.Pool({ connectionString, max: 10 });
  // An idle connection that breaks is replaced by the pool; without a listener it would end the process.
  pool.on('error', () => undefined);
  try {
    await migrateAlone(pool);
  } catch (cause) {
    await pool.end();
    throw cause;
  }
  return { db: drizzlePostgres({ client: pool, ...DRIZZLE }), close: () => pool.end() };
}

/** On one connection, since the lock belongs to it. */
async function migrateAlone(pool: pg.Pool): Promise<void> {
  const client = await pool.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await migratePostgres(drizzlePostgres({ client, ...DRIZZLE }), MIGRATE);
    await client.query('select pg_advisory_unlock($1)', [MIGRATION_LOCK]);
  } finally {
    client.release();
  }
}
