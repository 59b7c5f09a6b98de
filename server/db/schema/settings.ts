import { pgTable, text } from 'drizzle-orm/pg-core';

/** What the server knows of itself: `server-key`, encrypted under the master key. */
export const settings = pgTable('settings', {
  name: text().primaryKey(),
  value: text().notNull(),
});
