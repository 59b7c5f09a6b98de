import { doublePrecision, integer, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import { blobs } from './blobs.ts';
import { moment } from './columns.ts';
import { people } from './people.ts';
import { sheets } from './sheets.ts';

/** A pushed sheet. Only `state` and `stateSince` ever change, and only together with an event. */
export const revisions = pgTable(
  'revisions',
  {
    id: uuid().primaryKey(),
    sheetId: uuid()
      .notNull()
      .references(() => sheets.id),
    /** Counts from 1 within the sheet. */
    ordinal: integer().notNull(),
    letter: text().notNull(),
    title: text().notNull(),
    authorId: uuid()
      .notNull()
      .references(() => people.id),
    pushed: moment().notNull(),
    state: text({ enum: ['pushed', 'in check', 'checked', 'approved', 'returned'] }).notNull(),
    stateSince: moment().notNull(),
    /** Canonical JSON. */
    manifest: text().notNull(),
    manifestDigest: text().notNull(),
    reportDigest: text()
      .notNull()
      .references(() => blobs.digest),
    passed: integer().notNull(),
    failed: integer().notNull(),
    holds: integer().notNull(),
    governingPath: text(),
    governingLabel: text(),
    governingUtilisation: doublePrecision(),
  },
  (table) => [unique().on(table.sheetId, table.ordinal)],
);

export const revisionFiles = pgTable(
  'revision_files',
  {
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    /** The sheet is 0. */
    position: integer().notNull(),
    name: text().notNull(),
    digest: text()
      .notNull()
      .references(() => blobs.digest),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.position] }), unique().on(table.revisionId, table.name)],
);

/** Blocks of a revision's report, for marks to be held against without reading the report. */
export const revisionBlocks = pgTable(
  'revision_blocks',
  {
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    position: integer().notNull(),
    path: text().notNull(),
    digest: text().notNull(),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.position] }), unique().on(table.revisionId, table.path)],
);
