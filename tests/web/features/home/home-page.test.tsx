// @vitest-environment happy-dom
import { act, fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { type Home, homeSchema } from '#shared/contracts/home';
import { aSession } from '#tests/builders/a-session';
import { HomePage } from '../../../../web/features/home/components/home-page';
import { listenToAnnouncements, renderPage, stubServer } from '../../render-page';

const organisation = (last: number, name: string) => ({
  id: `0192f0a0-0000-7000-8000-00000000000${last}`,
  name,
});

const aSubmittal = (last: number, mixDesignation: string, next: string): Home['submittals'][number] => ({
  id: `0192f0a0-0000-7000-8000-00000000010${last}`,
  mixDesignation,
  description: '',
  project: { id: organisation(3, '').id, number: 'CV-2031', title: 'Hollin Ridge Road' },
  contractor: organisation(1, 'Brightwater Paving'),
  agency: { ...organisation(2, 'Carrow Valley Roads Authority'), timeZone: 'UTC' },
  revision: {
    number: 1,
    state: 'draft',
    disposition: null,
    submittedAt: null,
    returnedAt: null,
    dueOn: null,
    workingDaysTaken: null,
    summary: null,
    changes: null,
  },
  standingApproval: null,
  doubts: 0,
  updatedAt: '2026-03-12T09:00:00.000Z',
  next,
});

describe("a contractor's home", () => {
  it('says and brings into sight the mix that J and K go to', async () => {
    const home = homeSchema.parse({
      submittals: [aSubmittal(1, 'BW-125-S4', 'Submit revision 1'), aSubmittal(2, 'BW-190-B1', 'Nothing')],
      current: null,
      fromAgency: [],
      lastLetter: null,
      projects: [],
      laboratories: [],
      templates: [],
      abilities: { upload: true },
    });
    stubServer({ 'GET /api/session': aSession(), 'GET /api/home': home });
    const said = listenToAnnouncements();
    const { stop } = renderPage(<HomePage />, { path: '/', at: '/' });
    const row = (await screen.findByRole('rowheader', { name: 'BW-190-B1 r1' })).closest('tr');
    const brought = vi.fn<() => void>();
    if (row) row.scrollIntoView = brought;
    // The keys are bound once the drawn page has settled.
    await act(async () => undefined);
    act(() => void fireEvent.keyDown(document.body, { key: 'j' }));
    act(() => void fireEvent.keyDown(document.body, { key: 'j' }));
    expect(said).toEqual(['BW-125-S4 revision 1, Submit revision 1', 'BW-190-B1 revision 1, Nothing']);
    expect(brought).toHaveBeenCalledTimes(1);
    stop();
  });
});
