import { timestamp } from 'drizzle-orm/pg-core';

/** A moment, to the millisecond: the precision of the times that are signed. */
export const moment = () => timestamp({ withTimezone: true, precision: 3, mode: 'date' });
