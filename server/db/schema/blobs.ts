import { pgTable, text } from 'drizzle-orm/pg-core';

/** Sources and reports by the digest of their UTF-8 bytes: text, so that what is signed comes back byte for byte. */
export const blobs = pgTable('blobs', {
  digest: text().primaryKey(),
  text: text().notNull(),
});
