import { describe, expect, it } from 'vitest';
import type { QueueItem } from '#shared/contracts/queue';
import { groupQueue } from '../../../../web/features/queue/lib/group-queue';
import { cursorItem, stepCursor } from '../../../../web/features/queue/lib/queue-cursor';
import { aQueueItem } from './a-queue-item';

const items: QueueItem[] = [
  aQueueItem({ mixDesignation: 'KD-095-L1', group: 'with the contractor' }),
  aQueueItem({ mixDesignation: 'BW-095-R1', group: 'due this week' }),
  aQueueItem({ mixDesignation: 'TA-190-B2', group: 'late' }),
  aQueueItem({ mixDesignation: 'BW-250-B1', group: 'due this week' }),
];

describe('the queue by due date', () => {
  it('puts what is late first and what waits for a contractor last', () => {
    expect(groupQueue(items, 'due').map((group) => group.title)).toEqual([
      'Late',
      'Due this week',
      'With the contractor',
    ]);
  });

  it('keeps the order of the server inside a group', () => {
    expect(groupQueue(items, 'due')[1]?.items.map((item) => item.mixDesignation)).toEqual([
      'BW-095-R1',
      'BW-250-B1',
    ]);
  });

  it('counts submittals in words', () => {
    const [late, week, waiting] = groupQueue(items, 'due');
    expect(late?.detail).toBe('1 submittal');
    expect(week?.detail).toBe('2 submittals');
    expect(waiting?.detail).toBe('1 returned, waiting for a revision; the clock is stopped');
  });
});

describe('the queue by project', () => {
  it('heads each group with number and title, in the order of the numbers', () => {
    const first = {
      id: '00000000-0000-7000-8000-000000000001',
      number: 'CV-2019',
      title: 'Station Quarter streets',
    };
    const second = {
      id: '00000000-0000-7000-8000-000000000002',
      number: 'CV-2031',
      title: 'Hollin Ridge Road',
    };
    const mixed = [
      aQueueItem({ project: second }),
      aQueueItem({ project: first }),
      aQueueItem({ project: second }),
    ];
    expect(groupQueue(mixed, 'project').map(({ title, detail }) => [title, detail])).toEqual([
      ['CV-2019 Station Quarter streets', '1 submittal'],
      ['CV-2031 Hollin Ridge Road', '2 submittals'],
    ]);
  });
});

describe('the cursor of the queue', () => {
  const one = aQueueItem({ submittalId: '00000000-0000-7000-8000-00000000000a' });
  const two = aQueueItem({ submittalId: '00000000-0000-7000-8000-00000000000b' });

  it('stands on the first row until another is chosen', () => {
    expect(cursorItem([one, two], null)).toBe(one);
    expect(cursorItem([one, two], two.submittalId)).toBe(two);
  });

  it('returns to the first row when its own has left the queue', () => {
    expect(cursorItem([one], two.submittalId)).toBe(one);
  });

  it('holds at both ends', () => {
    expect(stepCursor([one, two], two.submittalId, 1)).toBe(two);
    expect(stepCursor([one, two], one.submittalId, -1)).toBe(one);
    expect(stepCursor([one, two], one.submittalId, 1)).toBe(two);
  });

  it('stands nowhere in an empty queue', () => {
    expect(stepCursor([], null, 1)).toBeNull();
  });
});
