// @vitest-environment happy-dom
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession } from '#tests/builders/a-session';
import { QueuePage } from '../../../../web/features/queue/components/queue-page';
import { renderPage, stubServer, WithFoot } from '../../render-page';
import { aQueueItem } from './a-queue-item';

const first = aQueueItem({ mixDesignation: 'TA-190-B2', abilities: { take: false, giveBack: true } });
const second = aQueueItem({ submittalId: '00000000-0000-7000-8000-000000000011' });

async function open() {
  const counts = { everyone: 2, mine: 1, notTaken: 1, toSign: 0, late: 0, withContractors: 0 };
  const sent = stubServer({
    'GET /api/session': aSession(),
    'GET /api/queue': { today: '2026-03-12', items: [first, second], counts, reviewWorkingDays: 10 },
  });
  renderPage(
    <WithFoot>
      <QueuePage filters={{ who: 'everyone', by: 'due' }} />
    </WithFoot>,
    { path: '/queue', at: '/queue' },
  );
  const foot = within(await screen.findByRole('contentinfo'));
  await foot.findByRole('link');
  return { foot, sent };
}

describe('the queue', () => {
  it('says who took a revision, or that nobody did', async () => {
    await open();
    expect(screen.getByRole('link', { name: 'Not taken, 1' })).toBeTruthy();
    expect(screen.getAllByText('not taken')).toHaveLength(2);
  });

  it('holds in its foot what can be done with the row that was tapped last', async () => {
    const { foot, sent } = await open();
    expect(foot.getByRole('link', { name: 'Open TA-190-B2 r1' })).toBeTruthy();
    expect(foot.queryByRole('button', { name: 'Take for review' })).toBeNull();
    fireEvent.click(screen.getByRole('rowheader', { name: 'BW-125-S4 r1' }));
    expect(foot.getByRole('link', { name: 'Open BW-125-S4 r1' })).toBeTruthy();
    fireEvent.click(foot.getByRole('button', { name: 'Take for review' }));
    await waitFor(() => expect(sent.some(({ method }) => method === 'PUT')).toBe(true));
    expect(sent.find(({ method }) => method === 'PUT')?.path).toContain(second.submittalId);
  });
});
