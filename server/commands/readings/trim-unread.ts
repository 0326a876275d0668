import type { ReadingResult } from '#rules/reading/reading-result';
import { countInFigures } from '#shared/format/numbers';

/** More than anybody looks through; and the kept reading has to fit into one packet to the database. */
export const mostUnreadPerSheet = 2000;

/**
 * Lists the first unused cells of each sheet one by one and the rest as a number, so that a sheet of raw logger data
 * beside the submittal neither disappears without a word nor outgrows the database.
 */
export function trimUnread(read: ReadingResult, most = mostUnreadPerSheet): ReadingResult {
  const seen = new Map<string, number>();
  const dropped = new Set<string>();
  const unread: ReadingResult['unread'] = [];
  for (const each of read.unread) {
    const count = (seen.get(each.sheet) ?? 0) + 1;
    seen.set(each.sheet, count);
    if (count <= most) unread.push(each);
    else dropped.add(placeOf(each));
  }
  if (dropped.size === 0) return read;
  for (const [sheet, count] of seen) {
    if (count <= most) continue;
    const more = count - most;
    const first = read.unread.filter((each) => each.sheet === sheet)[most];
    unread.push({
      sheet,
      cell: first?.cell ?? '',
      text: countInFigures(more, 'more cell'),
      reason: first?.reason ?? '',
    });
  }
  return {
    ...read,
    unread,
    uses: read.uses.filter((use) => use.use !== 'unused' || !dropped.has(placeOf(use))),
  };
}

function placeOf({ sheet, cell }: { sheet: string; cell: string }): string {
  return `${sheet}!${cell}`;
}
