import { boolean, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';
import { revisions } from './revisions.ts';

/** The last word of a checker on a block of a revision. A withdrawn mark stays as such, so that none is kept from before. */
export const marks = pgTable(
  'marks',
  {
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    path: text().notNull(),
    digest: text().notNull(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    isWithdrawn: boolean().notNull(),
    time: moment().notNull(),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.path] })],
);
