import { Problem } from '../problem';

/** Throws `not-allowed` where a policy says no; the object itself may be seen, so it is no 404. */
export function allow(allowed: boolean, detail?: string): void {
  if (!allowed) throw new Problem('not-allowed', detail === undefined ? {} : { detail });
}
