import { pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';

export const studies = pgTable('studies', {
  id: text().primaryKey(),
  title: text().notNull(),
  place: text().notNull(),
  created: moment().notNull(),
});

/** One row for each role that a person has in a study. */
export const studyMembers = pgTable(
  'study_members',
  {
    studyId: text()
      .notNull()
      .references(() => studies.id),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    role: text({ enum: ['engineer', 'checker', 'approver', 'reader'] }).notNull(),
  },
  (table) => [primaryKey({ columns: [table.studyId, table.personId, table.role] })],
);
