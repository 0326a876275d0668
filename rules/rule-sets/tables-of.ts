/** Ids of the tables that a rule, finished or not, names anywhere: as its measure, in a limit, as its rounding step. */
export function tablesOf({
  measure,
  limit,
  rounding,
}: Partial<Record<'measure' | 'limit' | 'rounding', unknown>>): Set<string> {
  const found = new Set<string>();
  const look = (value: unknown): void => {
    if (typeof value !== 'object' || value === null) return;
    for (const [name, part] of Object.entries(value)) {
      if (name === 'table' && typeof part === 'string') found.add(part);
      else look(part);
    }
  };
  look([measure, limit, rounding]);
  return found;
}
