import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';

export const sessions = pgTable(
  'sessions',
  {
    /** SHA-256 of the secret in the cookie. */
    secretHash: text().primaryKey(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    csrf: text().notNull(),
    created: moment().notNull(),
    lastSeen: moment().notNull(),
  },
  (table) => [index().on(table.lastSeen)],
);
