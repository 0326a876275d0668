// @vitest-environment happy-dom
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { cautions } from '#shared/cautions';
import { aCheckView } from '#tests/builders/a-check-view';
import { aRevision, noAbilities } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { FindingsPage } from '../../../../web/features/findings/components/findings-page';
import { renderPage, stubServer, WithFoot } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const base = `/api/submittals/${submittalId}/revisions/1`;

async function openFoot({ abilities = {}, check = {} }: { abilities?: object; check?: object }) {
  const sent = stubServer({
    'GET /api/session': aSession(),
    [`GET ${base}`]: aRevision({ abilities: { ...noAbilities, ...abilities } }),
    [`GET ${base}/check`]: aCheckView(check),
    [`PUT ${base}/reviewer`]: aRevision(),
    [`POST ${base}/reviewer`]: aRevision(),
  });
  renderPage(
    <WithFoot>
      <FindingsPage />
    </WithFoot>,
    { path: '/submittals/:submittalId/r/:number', at: `/submittals/${submittalId}/r/1` },
  );
  const foot = await screen.findByRole('contentinfo');
  await within(foot).findByText(/sealed/);
  return { foot, sent };
}

const actsIn = (foot: HTMLElement) =>
  [...foot.querySelectorAll('.foot-acts a, .foot-acts button')].map((act) => act.textContent);

describe('the foot of the findings', () => {
  it('takes a revision for review, where a phone has no other place for it', async () => {
    const { foot, sent } = await openFoot({ abilities: { take: true } });
    fireEvent.click(within(foot).getByRole('button', { name: 'Take for review' }));
    await waitFor(() => expect(sent.some(({ method }) => method !== 'GET')).toBe(true));
    expect(sent.find(({ method }) => method !== 'GET')?.path).toContain(base);
  });

  it('leads a contractor on to the next revision', async () => {
    const { foot } = await openFoot({ abilities: { startRevision: true } });
    const link = within(foot).getByRole('link', { name: 'Upload revision 2' });
    expect(link.getAttribute('href')).toBe(`/submittals/${submittalId}/next`);
  });

  it('holds the second act before the primary one, and never more than two', async () => {
    const { foot } = await openFoot({
      abilities: { note: true, reply: true, prepareReturn: true, sendReturn: true, giveBack: true },
    });
    expect(actsIn(foot)).toEqual(['Write a note', 'Decide and return']);
  });

  it('says both cautions where a starting point was used', async () => {
    const { foot } = await openFoot({ check: { startingPoint: true } });
    expect(within(foot).getByText(cautions.startingPoint)).toBeTruthy();
    expect(within(foot).getByText(cautions.findings)).toBeTruthy();
  });

  it('says at the end of the page what a narrow foot has no room for', async () => {
    await openFoot({ check: { startingPoint: true } });
    const closing = document.querySelector<HTMLElement>('.page-cautions');
    expect(closing?.textContent).toContain(cautions.startingPoint);
    expect(closing?.textContent).toContain(cautions.findings);
  });

  it('says of a pre-check on which date it judged as if it were submitted', async () => {
    const { foot } = await openFoot({ check: { kind: 'pre-check', submittedOn: '2026-12-01' } });
    expect(foot.textContent).toContain('judged as if submitted on 1 December 2026');
  });

  it('says no such date of a check of record', async () => {
    const { foot } = await openFoot({});
    expect(foot.textContent).not.toContain('as if submitted');
  });
});
