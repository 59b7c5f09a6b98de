import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { personKeys } from './keys.ts';
import { people } from './people.ts';
import { revisions } from './revisions.ts';

export const signatures = pgTable(
  'signatures',
  {
    id: uuid().primaryKey(),
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    role: text({ enum: ['author', 'checker', 'approver'] }).notNull(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    kid: text()
      .notNull()
      .references(() => personKeys.kid),
    name: text().notNull(),
    email: text().notNull(),
    meaning: text().notNull(),
    time: moment().notNull(),
    /** Compact JWS over the claims. */
    jws: text().notNull(),
  },
  (table) => [index().on(table.revisionId)],
);
