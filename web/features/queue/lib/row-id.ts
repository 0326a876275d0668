import type { QueueItem } from '#shared/contracts/queue';

export function rowId(item: Pick<QueueItem, 'submittalId'>): string {
  return `queue-${item.submittalId}`;
}
