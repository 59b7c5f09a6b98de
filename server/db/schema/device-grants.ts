import { integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';

/** Requests of command lines to act for a person (RFC 8628). */
export const deviceGrants = pgTable('device_grants', {
  deviceCodeHash: text().primaryKey(),
  userCode: text().notNull().unique(),
  client: text().notNull(),
  state: text({ enum: ['waiting', 'approved', 'refused'] }).notNull(),
  personId: uuid().references(() => people.id),
  requested: moment().notNull(),
  expires: moment().notNull(),
  /** Seconds that must pass between two polls; grows when the client does not wait. */
  interval: integer().notNull(),
  lastPolled: moment(),
});
