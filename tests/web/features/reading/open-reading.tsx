import { screen } from '@testing-library/react';
import type { z } from 'zod';
import type { previewSchema } from '#shared/contracts/corrections';
import { aCheckView } from '#tests/builders/a-check-view';
import { aReadingView } from '#tests/builders/a-reading-view';
import { aRevision } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { readingChoices } from '#tests/builders/reading-choices';
import { ReadingPage } from '../../../../web/features/reading/components/reading-page';
import { renderPage, stubServer } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
export const params = { submittalId, number: 1 };
export const base = `/api/submittals/${submittalId}/revisions/1`;
const at = `/submittals/${submittalId}/r/1/reading`;

const cell = (address: string, row: number, column: number, text: string) => ({
  address,
  row,
  column,
  kind: 'text',
  value: text,
  text,
  format: null,
  formula: null,
  cached: false,
  comment: null,
  bold: false,
});

const aSheet = {
  sheet: {
    name: 'Trials',
    hidden: false,
    rowCount: 5,
    columnCount: 4,
    cells: [cell('C2', 2, 3, '03/04/2026'), cell('D2', 2, 4, 'edge chip'), cell('C4', 4, 3, '4721,5')],
    merges: [],
    columnWidths: {},
    hiddenRows: [],
    hiddenColumns: [],
  },
  uses: [
    { sheet: 'Trials', cell: 'C2', use: 'doubt', taken: '' },
    { sheet: 'Trials', cell: 'D2', use: 'unused', taken: '' },
  ],
};

/** One reading changes and one finding passes that was undecided. */
export const aPreview: z.input<typeof previewSchema> = {
  counts: { added: 0, removed: 0, changed: 1 },
  readings: [],
  attributes: [],
  doubts: { before: 2, after: 1, raised: [] },
  findings: [
    {
      key: '412.03-vma~mix',
      clause: '412.03(b)',
      title: 'Voids in the mineral aggregate',
      severity: 'required',
      before: { outcome: 'undecided', borderline: false, sentence: 'Voids are in doubt.' },
      after: { outcome: 'pass', borderline: false, sentence: 'Voids are 14.3 %, at least 14.0.' },
    },
  ],
  summary: { before: aCheckView().summary, after: aCheckView().summary },
  learned: [],
  notLearned: [],
};

/** The reading page of a draft with one sheet, its grid drawn. */
export async function openReading(answers: Record<string, unknown> = {}, reading = aReadingView()) {
  const sent = stubServer(
    Object.assign(answers, {
      'GET /api/session': aSession(),
      [`GET ${base}`]: aRevision({ state: 'draft' }),
      [`GET ${base}/reading`]: reading,
      [`GET ${base}/sheet`]: aSheet,
      [`GET ${base}/reading/choices`]: readingChoices(),
      ...answers,
    }),
  );
  const page = renderPage(<ReadingPage params={params} />, {
    path: '/submittals/:submittalId/r/:number/reading',
    at,
  });
  await screen.findByRole('grid', {}, { timeout: 5000 });
  return { ...page, sent };
}
