import type { PgDatabase, PgQueryResultHKT } from 'drizzle-orm/pg-core';
import * as blobs from './schema/blobs.ts';
import * as deviceGrants from './schema/device-grants.ts';
import * as keys from './schema/keys.ts';
import * as log from './schema/log.ts';
import * as marks from './schema/marks.ts';
import * as people from './schema/people.ts';
import * as remarks from './schema/remarks.ts';
import * as revisions from './schema/revisions.ts';
import * as sessions from './schema/sessions.ts';
import * as settings from './schema/settings.ts';
import * as sheets from './schema/sheets.ts';
import * as signatures from './schema/signatures.ts';
import * as studies from './schema/studies.ts';
import * as tokens from './schema/tokens.ts';

export const schema = {
  ...blobs,
  ...deviceGrants,
  ...keys,
  ...log,
  ...marks,
  ...people,
  ...remarks,
  ...revisions,
  ...sessions,
  ...settings,
  ...sheets,
  ...signatures,
  ...studies,
  ...tokens,
};

/**
 * The database or a transaction in it, on PGlite or PostgreSQL. Inside a transaction use nothing but the transaction:
 * PGlite has one connection, and the outer handle would wait for itself.
 */
export type Database = PgDatabase<PgQueryResultHKT, typeof schema>;

export interface OpenDatabase {
  readonly db: Database;
  readonly close: () => Promise<void>;
}
