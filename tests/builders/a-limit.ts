import type { z } from 'zod';
import { type ResolvedLimit, resolvedLimitSchema } from '#rules/engine/finding';

/** A limit without bounds, in percent; override what matters. */
export function aLimit(overrides: Partial<z.input<typeof resolvedLimitSchema>> = {}): ResolvedLimit {
  return resolvedLimitSchema.parse({ min: null, max: null, unit: '%', ...overrides });
}
