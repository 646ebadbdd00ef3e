import { sql } from 'drizzle-orm';
import { customType, integer, timestamp, uuid } from 'drizzle-orm/pg-core';
import { v7 as uuidv7 } from 'uuid';

/** A primary key made by the app, so that rows sort by when they were made. */
export function idColumn() {
  return uuid('id').primaryKey().$defaultFn(newId);
}

/** A UUIDv7: the first 48 bits are milliseconds since 1970 (RFC 9562, section 5.7). */
export function newId(): string {
  return uuidv7();
}

/** An instant, kept in UTC with its zone. */
export function instant(name: string) {
  return timestamp(name, { withTimezone: true, mode: 'date' });
}

/** When a row was made and last changed. */
export function timestamps() {
  return {
    createdAt: instant('created_at')
      .notNull()
      .default(sql`now()`),
    updatedAt: instant('updated_at')
      .notNull()
      .default(sql`now()`),
  };
}

/** Counts the saves of a row that several people edit; a write names the one it saw. */
export function versionColumn() {
  return integer('version').notNull().default(1);
}

/** A few kilobytes kept in the row itself; anything larger belongs into the storage. */
export const bytes = customType<{ data: Uint8Array; driverData: Buffer }>({
  dataType: () => 'bytea',
  toDriver: (value) => Buffer.from(value),
});
