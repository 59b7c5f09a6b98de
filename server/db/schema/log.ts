import { index, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';
import { revisions } from './revisions.ts';

/** The append-only log: each event is a leaf of the Merkle tree, numbered from 0 without gaps. */
export const events = pgTable(
  'events',
  {
    index: integer().primaryKey(),
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    event: text({ enum: ['pushed', 'handed over', 'checked', 'approved', 'returned'] }).notNull(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    time: moment().notNull(),
    note: text().notNull(),
    /** The leaf's content: the canonical JSON of the event. */
    leaf: text().notNull(),
    leafHash: text().notNull(),
  },
  (table) => [index().on(table.revisionId)],
);

/** Heads of the log that the server has signed, one for each size. */
export const logHeads = pgTable('log_heads', {
  size: integer().primaryKey(),
  root: text().notNull(),
  time: moment().notNull(),
  jws: text().notNull(),
});
