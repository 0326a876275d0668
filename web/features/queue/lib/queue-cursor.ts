import type { QueueItem } from '#shared/contracts/queue';

/** The row that the cursor stands on: the one asked for where it is still in the queue, else the first. */
export function cursorItem(items: readonly QueueItem[], submittalId: string | null): QueueItem | null {
  return items.find((item) => item.submittalId === submittalId) ?? items[0] ?? null;
}

/** The row below or above the cursor; the ends hold. */
export function stepCursor(
  items: readonly QueueItem[],
  submittalId: string | null,
  step: 1 | -1,
): QueueItem | null {
  const present = cursorItem(items, submittalId);
  if (!present) return null;
  const index = items.indexOf(present) + step;
  return items[Math.min(Math.max(index, 0), items.length - 1)] ?? null;
}
