// @vitest-environment happy-dom
import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { RoomToMove } from '#rules/engine/room';
import { roomWords } from '#rules/engine/room-words';
import { aCheckView } from '#tests/builders/a-check-view';
import { aRevision } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { RoomPage } from '../../../../web/features/room/components/room-page';
import { renderPage, stubServer } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const base = `/api/submittals/${submittalId}/revisions/1`;
const at = `/submittals/${submittalId}/r/1`;

const room: RoomToMove = {
  declaredBinderContent: 5.4,
  trials: [4.8, 6.3].map((binderContent, place) => ({
    trial: 'AD'[place]!,
    binderContent,
    source: { sheet: 'Trials', cell: `C${place + 4}`, text: String(binderContent) },
  })),
  rules: [
    {
      rule: 'dust',
      clause: '412.03(d)',
      title: 'Dust proportion',
      state: 'computed',
      reason: null,
      limitWords: '0.6 to 1.2',
      fit: 'linear',
      trials: { from: 4.8, to: 6.3 },
      holds: [{ from: 5.35, to: 6.3, below: 'limit', above: 'trials' }],
    },
  ],
  room: { from: 5.35, to: 6.3, closedBelowBy: ['dust'], closedAboveBy: [], containsDeclared: true },
  excluding: [],
  reason: null,
};

async function open(shown: RoomToMove | null) {
  stubServer({
    'GET /api/session': aSession(),
    [`GET ${base}`]: aRevision(),
    [`GET ${base}/room`]: {
      room: shown && { ...shown, words: roomWords(shown) },
      earlier: { revision: 0, binderContent: 5.3 },
      seal: aCheckView().seal,
      startingPoint: false,
    },
  });
  const page = renderPage(<RoomPage />, { path: '/submittals/:submittalId/r/:number', at });
  await screen.findByRole('heading', { level: 1 });
  return page;
}

describe('the room to move', () => {
  it('is drawn with its answer as the text of the drawing, and both designs beside their dots', async () => {
    await open(room);
    const chart = screen.getByRole('group', { name: /A binder content of 5\.35 to 6\.30 % meets/ });
    expect(within(chart).getByText('room 5.35 to 6.30')).toBeTruthy();
    expect(within(chart).getByText('r1 5.40')).toBeTruthy();
    expect(within(chart).getByText('r0 5.30')).toBeTruthy();
    expect(within(chart).getByRole('link', { name: 'trial A, 4.80 % binder. Open its cell.' })).toBeTruthy();
  });

  it('shows the same as a table', async () => {
    await open(room);
    fireEvent.click(screen.getByRole('button', { name: 'Show as a table' }));
    const [, row] = screen.getAllByRole('row');
    expect(
      within(row!)
        .getAllByRole('cell')
        .map(({ textContent }) => textContent),
    ).toEqual(['Dust proportion', '0.6 to 1.2', '5.35', 'the limit', '6.30', 'the last trial']);
    expect(screen.getByRole('button', { name: 'Show as a chart' })).toBeTruthy();
  });

  it('leads from each rule to its finding', async () => {
    await open(room);
    expect(screen.getByRole('link', { name: '412.03(d)' }).getAttribute('href')).toBe(`${at}#412.03(d)`);
  });

  it('says over the drawing where no content meets all', async () => {
    const none: RoomToMove = {
      ...room,
      rules: room.rules.map((rule) => ({ ...rule, holds: [] })),
      room: null,
      excluding: ['dust'],
    };
    await open(none);
    expect(
      screen.getAllByText(/No binder content meets .*: dust proportion holds nowhere within the trials\./),
    ).toHaveLength(2);
  });

  it('says where there is none to look at', async () => {
    await open(null);
    expect(screen.getByText(/This check has no room to move/)).toBeTruthy();
  });
});
