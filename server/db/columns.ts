import {
  type AnyMySqlColumn,
  char,
  customType,
  datetime,
  foreignKey,
  int,
  varchar,
} from 'drizzle-orm/mysql-core';
import type { z } from 'zod';

/** UUIDv7 in text form: 36 ASCII bytes, so that a row found in a log can be looked up as it stands. */
export const id = customType<{ data: string; driverData: string }>({
  dataType: () => 'char(36) character set ascii collate ascii_bin',
});

/** An instant in UTC to the millisecond. */
export function instant<Name extends string>(name: Name) {
  return datetime(name, { mode: 'date', fsp: 3 });
}

/** Hexadecimal SHA-256. */
export function sha256<Name extends string>(name: Name) {
  return char(name, { length: 64 });
}

/** One word of a closed list. */
export function choice<Value extends string>(name: string, values: readonly Value[]) {
  return varchar(name, { length: 30, enum: values as [Value, ...Value[]] });
}

export const longBlob = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'longblob' });

/** Raised at each write; writers name the version that they saw. */
export function version() {
  return int('version').notNull().default(1);
}

/**
 * MariaDB's JSON is checked text. The one codec: written as text, parsed by the schema when read, so that
 * a row from an older release is either understood or refused, never half understood.
 */
export function json<Schema extends z.ZodType>(name: string, schema: Schema) {
  return customType<{ data: z.output<Schema>; driverData: string }>({
    dataType: () => 'json',
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (stored) => schema.parse(JSON.parse(stored)) as z.output<Schema>,
  })(name);
}

/** A foreign key with a name of ours: generated names overflow MariaDB's 64 characters. */
export function reference(name: string, column: AnyMySqlColumn, target: AnyMySqlColumn) {
  return foreignKey({ name, columns: [column], foreignColumns: [target] });
}
