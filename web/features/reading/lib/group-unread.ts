import type { ReadingView } from '#shared/contracts/readings';

type Unread = ReadingView['unread'][number];

export interface UnreadGroup {
  sheet: string;
  /** The first cell, to go to. */
  cell: string;
  reason: string;
  /** What the cell says, where the group is one cell. */
  text: string | null;
  count: number;
}

/** Cells of one sheet left out for the same reason stand in one line; the order of the workbook is kept. */
export function groupUnread(unread: readonly Unread[]): UnreadGroup[] {
  const groups = new Map<string, UnreadGroup>();
  for (const { sheet, cell, text, reason } of unread) {
    const key = JSON.stringify([sheet, reason]);
    const group = groups.get(key);
    if (group) {
      group.count += 1;
      group.text = null;
    } else {
      groups.set(key, { sheet, cell, reason, text, count: 1 });
    }
  }
  return [...groups.values()];
}
