import { pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns.ts';
import { people } from './people.ts';

/** A person's signing key (Ed25519). Its private half rests encrypted under a key derived from the person's password. */
export const personKeys = pgTable('person_keys', {
  kid: text().primaryKey(),
  personId: uuid()
    .notNull()
    .unique()
    .references(() => people.id),
  x: text().notNull(),
  /** Salt of the derivation, base64url. */
  salt: text().notNull(),
  /** AES-256-GCM: nonce, ciphertext and tag, base64url. */
  sealed: text().notNull(),
  created: moment().notNull(),
});
