import { pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { studies } from './studies.ts';

export const sheets = pgTable(
  'sheets',
  {
    id: uuid().primaryKey(),
    studyId: text()
      .notNull()
      .references(() => studies.id),
    number: text().notNull(),
    created: moment().notNull(),
  },
  (table) => [unique().on(table.studyId, table.number)],
);
