import { boolean, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';

export const people = pgTable('people', {
  id: uuid().primaryKey(),
  name: text().notNull(),
  email: text().notNull(),
  /** The form of the address by which people are told apart. */
  emailKey: text().notNull().unique(),
  passwordHash: text().notNull(),
  /** Invented people of the demo study, whose password is public: they may sign in on a demo server only. */
  isDemo: boolean().notNull(),
  created: moment().notNull(),
});

/** Failed sign-ins by account, whether or not there is such an account: both are answered alike. */
export const signInFailures = pgTable('sign_in_failures', {
  accountHash: text().primaryKey(),
  failures: integer().notNull(),
  lockedUntil: moment(),
  lastFailure: moment().notNull(),
});
