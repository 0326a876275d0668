import type { QueueItem } from '#shared/contracts/queue';

/** A queue row with fixed, valid values; a test names only what it is about. */
export function aQueueItem(given: Partial<QueueItem> = {}): QueueItem {
  return {
    submittalId: '00000000-0000-7000-8000-000000000010',
    mixDesignation: 'BW-125-S4',
    revision: 1,
    version: 3,
    contractor: { id: '00000000-0000-7000-8000-000000000020', name: 'Brightwater Paving' },
    project: {
      id: '00000000-0000-7000-8000-000000000030',
      number: 'CV-2031',
      title: 'Hollin Ridge Road, resurfacing',
    },
    description: '12.5 mm surface, 12 million ESAL',
    group: 'next week and after',
    receivedOn: '2026-03-09',
    dueOn: '2026-03-23',
    workingDaysLeft: 7,
    summary: {
      pass: 24,
      fail: 3,
      notShown: 2,
      undecided: 2,
      notApplicable: 6,
      borderline: 2,
      doesNotAddUp: 0,
      recommended: 'revise and resubmit',
    },
    reviewer: null,
    returnState: null,
    stands: 'submitted',
    returnedOn: null,
    abilities: { take: true, giveBack: false },
    ...given,
  };
}
