import { integer, text } from 'drizzle-orm/sqlite-core';

/** A random UUID made by the verb that inserts the row. */
export const idColumn = () => text().primaryKey();

/** A moment in UTC, kept as milliseconds. */
export const momentColumn = () => integer({ mode: 'timestamp_ms' });
