import { createHash } from 'node:crypto';

/** 5 January 2026, in milliseconds since 1970: when the demo's rows claim to have been made. */
const madeAtMs = Date.UTC(2026, 0, 5, 8, 0, 0);

/** The same UUIDv7 for the same name at every seeding, so that links into the demo keep working. */
export function demoId(name: string): string {
  const time = madeAtMs.toString(16).padStart(12, '0');
  const rest = createHash('sha256').update(name).digest('hex');
  const variant = ((Number.parseInt(rest[3] ?? '0', 16) & 0x3) | 0x8).toString(16);
  return `${time.slice(0, 8)}-${time.slice(8)}-7${rest.slice(0, 3)}-${variant}${rest.slice(4, 7)}-${rest.slice(7, 19)}`;
}

export const demoMadeAt = new Date(madeAtMs);
