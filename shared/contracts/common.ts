import { z } from 'zod';

export const idSchema = z.uuid();
/** An instant in UTC, `2026-03-09T14:02:11.000Z`. */
export const instantSchema = z.iso.datetime();
export const dateSchema = z.iso.date();

export const personReferenceSchema = z.strictObject({ id: idSchema, name: z.string() });
export const organisationReferenceSchema = z.strictObject({ id: idSchema, name: z.string() });

/** With the time zone in which the dates of its submittals are told, to both sides. */
export const agencyReferenceSchema = organisationReferenceSchema.extend({ timeZone: z.string() });

export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.strictObject({ items: z.array(item), nextCursor: z.string().nullable() });
}
