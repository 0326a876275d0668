import type { QueueItem } from '#shared/contracts/queue';
import { countInFigures } from '#shared/format/numbers';

export interface QueueGroup {
  key: string;
  title: string;
  /** "3 submittals" */
  detail: string;
  items: QueueItem[];
}

const titles: Record<QueueItem['group'], string> = {
  late: 'Late',
  'due this week': 'Due this week',
  'next week and after': 'Next week and after',
  'with the contractor': 'With the contractor',
};

const order = Object.keys(titles) as QueueItem['group'][];

/** The queue in the order of its clocks, or by project; groups without a submittal are left out. */
export function groupQueue(items: readonly QueueItem[], by: 'due' | 'project'): QueueGroup[] {
  return by === 'due' ? byDue(items) : byProject(items);
}

function byDue(items: readonly QueueItem[]): QueueGroup[] {
  return order.flatMap((group) => {
    const own = items.filter((item) => item.group === group);
    if (own.length === 0) return [];
    const detail = group === 'with the contractor' ? withContractorWords(own.length) : countWords(own.length);
    return [{ key: group, title: titles[group], detail, items: own }];
  });
}

function byProject(items: readonly QueueItem[]): QueueGroup[] {
  const groups = new Map<string, QueueItem[]>();
  for (const item of items) groups.set(item.project.id, [...(groups.get(item.project.id) ?? []), item]);
  return [...groups.entries()]
    .map(([key, own]) => ({
      key,
      title: own[0] ? `${own[0].project.number} ${own[0].project.title}` : '',
      detail: countWords(own.length),
      items: own,
    }))
    .sort((one, other) => (one.title < other.title ? -1 : 1));
}

function countWords(count: number): string {
  return countInFigures(count, 'submittal');
}

function withContractorWords(count: number): string {
  return `${count} returned, waiting for a revision; the clock is stopped`;
}
