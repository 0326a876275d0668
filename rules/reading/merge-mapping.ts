import type { MappingRule } from './mapping';

export interface MergeMapping {
  /** The rules of the newest version. */
  newest: readonly MappingRule[];
  /** The rules that the workbook was read with, which stand again where it takes its own back. */
  base: readonly MappingRule[];
  /** Ids that this workbook gave before, and what it gives now. */
  before: readonly string[];
  now: readonly MappingRule[];
  dropped: readonly string[];
}

/**
 * What a workbook teaches takes the place of what it taught before; what others taught meanwhile stays. Rules of single
 * cells come first: of two rules that mean a cell the first one holds.
 */
export function mergeMapping({ newest, base, before, now, dropped }: MergeMapping): MappingRule[] {
  const own = new Set(before);
  const taught = new Set(now.map(({ id }) => id));
  const gone = new Set(dropped);
  const kept = newest.filter(({ id }) => !own.has(id) && !taught.has(id) && !gone.has(id));
  const again = base.filter(
    ({ id }) => own.has(id) && !taught.has(id) && !gone.has(id) && !kept.some((each) => each.id === id),
  );
  const all = [...kept, ...again, ...now];
  return [...all.filter(isNarrow), ...all.filter((rule) => !isNarrow(rule))];
}

function isNarrow({ anchor }: MappingRule): boolean {
  return anchor.under !== undefined || anchor.sheet !== null || anchor.header.length > 1;
}
