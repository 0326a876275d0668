import { type ReadingView, readingViewSchema } from '#shared/contracts/readings';

/** One sheet with two doubts, read by the template's mapping; the reader may answer. */
export function aReadingView(overrides: Partial<ReadingView> = {}): ReadingView {
  return readingViewSchema.parse({
    version: 4,
    fileName: 'BW-125-S4 r1.xlsx',
    sha256: '2c9e04b7'.repeat(8),
    mappingName: 'Template of Section 412',
    sheets: [
      { name: 'Submittal', hidden: false, read: 12, doubts: 0, unused: 0 },
      { name: 'Trials', hidden: false, read: 80, doubts: 2, unused: 1 },
      { name: 'Lists', hidden: true, read: 0, doubts: 0, unused: 3 },
    ],
    doubts: [
      {
        sheet: 'Trials',
        cell: 'C2',
        text: '03/04/2026',
        reason: 'C2 says 03/04/2026. Which day was it tested?',
        alternatives: [
          { answer: '2026-04-03', label: '3 April 2026' },
          { answer: '2026-03-04', label: '4 March 2026' },
        ],
        about: {},
        letter: 'a',
        answer: null,
      },
      {
        sheet: 'Trials',
        cell: 'C4',
        text: '4721,5',
        reason: 'C4 has a decimal comma.',
        alternatives: [{ answer: '4721.5', label: '4721.5 g' }],
        about: {},
        letter: 'b',
        answer: null,
      },
    ],
    stale: [],
    unread: [{ sheet: 'Trials', cell: 'D2', text: 'edge chip', reason: 'A remark.' }],
    counts: { readings: 92, attributes: 8, documents: 1 },
    understood: [{ label: 'binder content', count: 5, sheet: 'Submittal', cell: 'B14' }],
    asked: [],
    documents: [],
    mapping: null,
    learned: null,
    corrections: [],
    typed: [],
    abilities: { answer: true, attach: true },
    ...overrides,
  } satisfies ReadingView);
}
