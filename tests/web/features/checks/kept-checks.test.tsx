// @vitest-environment happy-dom
import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aCheckView } from '#tests/builders/a-check-view';
import { aFinding } from '#tests/builders/a-finding';
import { aRevision } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { ChecksPage } from '../../../../web/features/checks/components/checks-page';
import { KeptCheckPage } from '../../../../web/features/checks/components/kept-check-page';
import { renderPage, stubServer } from '../../render-page';

const revision = aRevision();
const { submittalId, number } = revision;
const base = `/api/submittals/${submittalId}/revisions/${number}`;
const at = `/submittals/${submittalId}/r/${number}/checks`;

const head = (check: number, madeAt: string) => ({
  number: check,
  kind: 'check of record',
  madeAt,
  madeBy: 'Ines Tordoff',
  submittedOn: '2026-03-09',
  base: { ruleSet: 'cvra-412', edition: '2026', title: 'Section 412' },
  layers: [],
  engineVersion: '7',
  seal: `7f3a91c0${'0'.repeat(52)}5be2`,
  recommended: 'rejected',
});
const answers = {
  'GET /api/session': aSession(),
  [`GET ${base}`]: revision,
  [`GET ${base}/checks`]: {
    checks: [head(3, '2026-03-11T14:02:00.000Z'), head(2, '2026-03-09T14:02:00.000Z')],
  },
  [`GET ${base}/checks/2`]: {
    ...head(2, '2026-03-09T14:02:00.000Z'),
    summary: aCheckView().summary,
    findings: [
      aFinding({ outcome: 'undecided', sentence: 'Voids are 3.9 %.', reason: 'One specimen only.' }),
    ],
    startingPoint: true,
  },
};

describe('the checks of a revision', () => {
  it('are listed with date, edition, engine, seal and recommendation, each with the way to its findings', async () => {
    stubServer(answers);
    renderPage(<ChecksPage />, { path: '/submittals/:submittalId/r/:number/checks', at });
    const [, newest, first] = within(await screen.findByRole('table')).getAllByRole('row');
    for (const row of [newest, first]) {
      expect(row?.textContent).toContain('Section 412, edition 2026');
      expect(row?.textContent).toContain('7f3a 91c0 … 5be2');
      expect(row?.textContent).toContain('rejected');
      expect(row?.textContent).toContain('by Ines Tordoff');
    }
    const link = within(first as HTMLElement).getByRole('link');
    expect(link.getAttribute('href')).toBe(`${at}/2`);
  });

  it('are shown as they were made, and nothing is done on them', async () => {
    stubServer(answers);
    renderPage(<KeptCheckPage number={2} />, {
      path: '/submittals/:submittalId/r/:number/checks/:check',
      at: `${at}/2`,
    });
    const row = within(await screen.findByRole('table')).getAllByRole('row')[1];
    expect(row?.textContent).toContain('Voids are 3.9 %. One specimen only.');
    expect(row?.textContent).toContain('Undecided');
    expect(screen.queryAllByRole('button')).toEqual([]);
  });
});
