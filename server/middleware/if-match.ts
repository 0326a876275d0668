import { Problem } from '../problem';

/** `If-Match: "3"` or `If-Match: 3`. */
export function versionFrom(header: string | undefined): number {
  if (header === undefined) throw new Problem('version-missing');
  const match = /^(?:W\/)?"?(\d{1,9})"?$/.exec(header.trim());
  if (!match) {
    throw new Problem('version-missing', { detail: 'If-Match holds no version.' });
  }
  return Number(match[1]);
}

/** Throws with the present state where the writer saw an older one. */
export function expectVersion(seen: number, present: { version: number }): void {
  if (seen !== present.version) throw new Problem('version-stale', { present });
}

/**
 * The write itself is conditional on the version as well: two writers may both have passed the check above.
 * `result` is what the driver answers to an update.
 */
export function expectWritten(result: readonly [{ affectedRows: number }, ...unknown[]]): void {
  if (result[0].affectedRows !== 1) throw new Problem('version-stale');
}
