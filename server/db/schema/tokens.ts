import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';

/** Personal tokens for the command line. */
export const accessTokens = pgTable(
  'access_tokens',
  {
    id: uuid().primaryKey(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    label: text().notNull(),
    secretHash: text().notNull().unique(),
    created: moment().notNull(),
    lastUsed: moment(),
  },
  (table) => [index().on(table.personId)],
);
