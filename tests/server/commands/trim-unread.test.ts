import { expect, it } from 'vitest';
import { type ReadingResult, readingResultSchema } from '#rules/reading/reading-result';
import { trimUnread } from '#server/commands/readings/trim-unread';

const cells = (sheet: string, count: number) =>
  Array.from({ length: count }, (_, index) => ({
    sheet,
    cell: `A${index + 1}`,
    text: 'x',
    reason: 'No rule.',
  }));
const reading = (unread: ReadingResult['unread']): ReadingResult =>
  readingResultSchema.parse({
    record: {},
    doubts: [],
    unread,
    uses: [
      { sheet: 'Trials', cell: 'B1', use: 'read', taken: 'Gmm' },
      ...unread.map(({ sheet, cell }) => ({ sheet, cell, use: 'unused', taken: 'No rule.' })),
    ],
    answered: [],
    stale: [],
  });

it('lists every unused cell up to the most, that many included', () => {
  const read = reading([...cells('Trials', 3), ...cells('Logger', 3)]);
  expect(trimUnread(read, 3)).toEqual(read);
});

it('says of each sheet how many more there are, and keeps what was read', () => {
  const trimmed = trimUnread(reading([...cells('Trials', 2), ...cells('Logger', 5)]), 3);
  expect(trimmed.unread).toEqual([
    ...cells('Trials', 2),
    ...cells('Logger', 3),
    { sheet: 'Logger', cell: 'A4', text: '2 more cells', reason: 'No rule.' },
  ]);
  expect(trimmed.uses.map(({ sheet, cell, use }) => `${sheet} ${cell} ${use}`)).toEqual([
    'Trials B1 read',
    'Trials A1 unused',
    'Trials A2 unused',
    'Logger A1 unused',
    'Logger A2 unused',
    'Logger A3 unused',
  ]);
});
