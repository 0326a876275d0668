import { z } from 'zod';

/** Where a page ended: the sort instant and the id that breaks ties. */
export interface Cursor {
  at: Date;
  id: string;
}

const cursorSchema = z.tuple([z.iso.datetime(), z.uuid()]);

export function writeCursor({ at, id }: Cursor): string {
  return Buffer.from(JSON.stringify([at.toISOString(), id])).toString('base64url');
}

/** Null where the text is not a cursor that this server wrote. */
export function readCursor(text: string): Cursor | null {
  try {
    const parsed = cursorSchema.safeParse(JSON.parse(Buffer.from(text, 'base64url').toString('utf8')));
    return parsed.success ? { at: new Date(parsed.data[0]), id: parsed.data[1] } : null;
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
