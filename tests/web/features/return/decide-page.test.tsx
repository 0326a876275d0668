// @vitest-environment happy-dom
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { cautions } from '#shared/cautions';
import { aReturnView } from '#tests/builders/a-return-view';
import { aRevision, noAbilities } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { ReturnPage } from '../../../../web/features/return/components/return-page';
import { aProblemResponse, listenToAnnouncements, renderPage, stubServer, WithFoot } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const params = { submittalId, number: 1 };
const base = `/api/submittals/${submittalId}/revisions/1`;

async function open(answers: Record<string, unknown> = {}, view = aReturnView()) {
  const sent = stubServer({
    'GET /api/session': aSession(),
    [`GET ${base}`]: aRevision(),
    [`GET ${base}/return`]: view,
    ...answers,
  });
  const page = renderPage(<ReturnPage params={params} />, {
    path: '/submittals/:submittalId/r/:number/return',
    at: `/submittals/${submittalId}/r/1/return`,
  });
  await screen.findByRole('heading', { name: 'Decide and return' }, { timeout: 5000 });
  return { ...page, sent };
}

type Sent = Awaited<ReturnType<typeof open>>['sent'];
const acts = (sent: Sent) =>
  sent
    .filter(({ method }) => method !== 'GET')
    .map(({ method, path }) => `${method} ${path.replace(base, '')}`);
const reason = () => screen.getByRole('textbox', { name: 'Reason' });

describe('deciding on a return', () => {
  it('keeps what is entered as a draft by itself when the typing rests', async () => {
    const { sent } = await open({
      [`PUT ${base}/return`]: aReturnView({ version: 8, reason: 'The mix is close.' }),
    });
    fireEvent.change(reason(), { target: { value: 'The mix is close.' } });
    await waitFor(() => expect(acts(sent)).toEqual(['PUT /return']), { timeout: 4000 });
    const request = sent.find(({ method }) => method === 'PUT');
    expect(request?.headers.get('If-Match')).toBe('"7"');
    expect(request?.body).toMatchObject({ reason: 'The mix is close.', disposition: 'revise and resubmit' });
  });

  it('keeps what was just entered before it signs and sends, and signs that version', async () => {
    const { sent } = await open({
      [`PUT ${base}/return`]: aReturnView({ version: 8 }),
      [`POST ${base}/return/sending`]: aReturnView({ version: 9 }),
    });
    fireEvent.change(reason(), { target: { value: 'The mix is close.' } });
    fireEvent.click(screen.getByRole('button', { name: 'Sign and send' }));
    await waitFor(() => expect(acts(sent)).toEqual(['PUT /return', 'POST /return/sending']));
    expect(sent.find(({ path }) => path.endsWith('/sending'))?.headers.get('If-Match')).toBe('"8"');
  });

  it('keeps once where the typing rests while a slow server still keeps what is to be signed', async () => {
    const { sent } = await open({
      [`PUT ${base}/return`]: aReturnView({ version: 8 }),
      [`POST ${base}/return/sending`]: aReturnView({ version: 9 }),
    });
    const answer = globalThis.fetch;
    vi.stubGlobal('fetch', async (input: string, init?: RequestInit) => {
      if (init?.method === 'PUT') await new Promise((resolve) => setTimeout(resolve, 1400));
      return answer(input, init);
    });
    fireEvent.change(reason(), { target: { value: 'The mix is close.' } });
    fireEvent.click(screen.getByRole('button', { name: 'Sign and send' }));
    await waitFor(() => expect(acts(sent)).toContain('POST /return/sending'), { timeout: 4000 });
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(acts(sent)).toEqual(['PUT /return', 'POST /return/sending']);
  });

  it('does not send a decision against the recommendation without a reason, and says so at the field', async () => {
    const { sent } = await open({
      [`PUT ${base}/return`]: aReturnView({ version: 8, disposition: 'approved' }),
    });
    fireEvent.click(screen.getByRole('radio', { name: 'approved' }));
    fireEvent.click(screen.getByRole('button', { name: 'Sign and send' }));
    expect(await screen.findByText(/Say why you decide otherwise/)).toBeTruthy();
    await waitFor(() => expect(acts(sent)).toEqual(['PUT /return']), { timeout: 4000 });
  });

  it('puts what the server refuses on the field that it names', async () => {
    const refusal = aProblemResponse('invalid-input', 422, {
      title: 'Some of what was sent cannot be used',
      errors: [{ pointer: '/reason', detail: 'Give the reason of a rejection.' }],
    });
    await open({ [`PUT ${base}/return`]: refusal });
    fireEvent.change(reason(), { target: { value: 'No.' } });
    const message = await screen.findByText('Give the reason of a rejection.', {}, { timeout: 4000 });
    expect(reason().getAttribute('aria-describedby')?.split(' ')).toContain(message.closest('[id]')?.id);
    expect(reason().getAttribute('aria-invalid')).toBe('true');
  });

  it('lets the reader choose where the draft was changed elsewhere, and loses nothing', async () => {
    const stale = aProblemResponse('version-stale', 412, { title: 'It has changed since you saw it' });
    await open({ [`PUT ${base}/return`]: stale });
    fireEvent.change(reason(), { target: { value: 'The mix is close.' } });
    expect(
      await screen.findByRole('button', { name: 'Take the present state' }, { timeout: 4000 }),
    ).toBeTruthy();
    expect((reason() as HTMLTextAreaElement).value).toBe('The mix is close.');
  });

  it('ticks what the letter has to carry for good and leaves the rest to the reader', async () => {
    const { sent } = await open({ [`PUT ${base}/return`]: aReturnView({ version: 8 }) });
    const fixed = screen.getByRole<HTMLInputElement>('checkbox', { name: /Include 412.03\(b\)/ });
    const free = screen.getByRole<HTMLInputElement>('checkbox', { name: /Include 412.03\(c\)/ });
    expect([fixed.checked, fixed.disabled]).toEqual([true, true]);
    expect([free.checked, free.disabled]).toEqual([false, false]);
    fireEvent.click(free);
    await waitFor(
      () =>
        expect(sent.find(({ method }) => method === 'PUT')?.body).toMatchObject({
          included: ['vfa~design point'],
        }),
      { timeout: 4000 },
    );
  });

  it('offers a reviewer only to hand the return on', async () => {
    await open({}, aReturnView({ abilities: { change: true, makeReady: true, send: false } }));
    expect(screen.queryByRole('button', { name: 'Sign and send' })).toBeNull();
    expect(screen.getByRole('button', { name: 'Send to Mairi Halloran to sign' })).toBeTruthy();
    expect(screen.getByText('4 internal notes stay here.')).toBeTruthy();
  });
});

describe('the foot of a return', () => {
  it('holds both acts and the caution', async () => {
    stubServer({
      'GET /api/session': aSession(),
      [`GET ${base}`]: aRevision(),
      [`GET ${base}/return`]: aReturnView(),
    });
    renderPage(
      <WithFoot>
        <ReturnPage params={params} />
      </WithFoot>,
      { path: '/submittals/:submittalId/r/:number/return', at: `/submittals/${submittalId}/r/1/return` },
    );
    const foot = within(await screen.findByRole('contentinfo'));
    expect(await foot.findByRole('button', { name: 'Sign and send' })).toBeTruthy();
    expect(foot.getByRole('button', { name: 'Send to Mairi Halloran to sign' })).toBeTruthy();
    expect(foot.getByText(cautions.findings)).toBeTruthy();
  });
});

describe('editing a note from the letter', () => {
  it('goes to the finding of the item in focus with E, and says where there is none', async () => {
    const said = listenToAnnouncements();
    const { router, stop } = await open({
      [`GET ${base}`]: aRevision({ abilities: { ...noAbilities, note: true } }),
    });
    fireEvent.keyDown(document.body, { key: 'e' });
    expect(said).toEqual(['Go to a finding of the letter first.']);
    const link = screen.getByRole('link', { name: '412.03(b)' });
    act(() => link.focus());
    fireEvent.keyDown(link, { key: 'e' });
    await waitFor(() => expect(router.state.location.hash).toBe('#vma~design-point'));
    expect(router.state.location.state).toEqual({ editNote: true });
    stop();
  });
});

describe('a sent return', () => {
  const sentView = aReturnView({
    state: 'sent',
    sent: {
      at: '2026-03-12T10:52:00.000Z',
      by: 'Mairi Halloran',
      mail: [
        { to: 'dele.fairweather@brightwater.example', state: 'failed', attempts: 3, lastProblem: 'Refused.' },
      ],
      letterSha256: 'a'.repeat(64),
      workbookSha256: null,
    },
    abilities: { change: false, makeReady: false, send: false },
  });

  it('shows the agency how its mail fares and each side the notes with their replies', async () => {
    stubServer({
      'GET /api/session': aSession(),
      [`GET ${base}`]: aRevision({ state: 'returned', disposition: 'revise and resubmit' }),
      [`GET ${base}/return`]: sentView,
      [`GET ${base}/returned-notes`]: { notes: [], sentOn: '2026-03-12' },
    });
    renderPage(<ReturnPage params={params} />, {
      path: '/submittals/:submittalId/r/:number/return',
      at: `/submittals/${submittalId}/r/1/return`,
    });
    const table = await screen.findByRole('table');
    expect(within(table).getByText('Refused.')).toBeTruthy();
    expect(screen.getByText('The letter came without notes.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Sign and send' })).toBeNull();
  });
});
