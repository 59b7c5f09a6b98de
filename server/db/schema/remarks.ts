import { index, integer, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';
import { revisions } from './revisions.ts';
import { sheets } from './sheets.ts';

export const remarks = pgTable(
  'remarks',
  {
    id: uuid().primaryKey(),
    sheetId: uuid()
      .notNull()
      .references(() => sheets.id),
    /** The revision on which it was raised. */
    revisionId: uuid()
      .notNull()
      .references(() => revisions.id),
    path: text().notNull(),
    weight: text({ enum: ['question', 'should fix', 'must fix'] }).notNull(),
    text: text().notNull(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    time: moment().notNull(),
    state: text({ enum: ['open', 'answered', 'resolved'] }).notNull(),
    resolvedAt: moment(),
    resolvedBy: uuid().references(() => people.id),
    /** Grows with every change; the remark's ETag. */
    version: integer().notNull(),
  },
  (table) => [index().on(table.sheetId)],
);

export const replies = pgTable(
  'replies',
  {
    remarkId: uuid()
      .notNull()
      .references(() => remarks.id),
    position: integer().notNull(),
    personId: uuid()
      .notNull()
      .references(() => people.id),
    text: text().notNull(),
    time: moment().notNull(),
  },
  (table) => [primaryKey({ columns: [table.remarkId, table.position] })],
);
