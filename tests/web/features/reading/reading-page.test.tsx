// @vitest-environment happy-dom
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { aCheckView } from '#tests/builders/a-check-view';
import { aFinding } from '#tests/builders/a-finding';
import { aReadingView } from '#tests/builders/a-reading-view';
import { aRevision } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { ReadingPage } from '../../../../web/features/reading/components/reading-page';
import { checkQuery } from '../../../../web/lib/queries/check-query';
import { aProblemResponse, listenToAnnouncements, renderPage, stubServer } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const params = { submittalId, number: 1 };
const base = `/api/submittals/${submittalId}/revisions/1`;
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

async function open(answers: Record<string, unknown> = {}, reading = aReadingView()) {
  const sent = stubServer(
    Object.assign(answers, {
      'GET /api/session': aSession(),
      [`GET ${base}`]: aRevision({ state: 'draft' }),
      [`GET ${base}/reading`]: reading,
      [`GET ${base}/sheet`]: aSheet,
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

const press = (key: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key });
const selected = () => screen.getByRole('gridcell', { selected: true }).textContent;
const kept = (sent: Awaited<ReturnType<typeof open>>['sent']) =>
  sent.filter((request) => request.method === 'PUT').map((request) => request.body);

describe('the reading page', () => {
  it('begins at the first doubt without an answer', async () => {
    const { stop } = await open();
    expect(selected()).toContain('03/04/2026');
    stop();
  });

  it('answers the doubt at the cursor with a number key, for the version that was seen', async () => {
    const answered = aReadingView({ version: 5 });
    const { sent, stop } = await open({ [`PUT ${base}/answers`]: answered });
    press('2');
    await waitFor(() =>
      expect(kept(sent)).toEqual([
        { answers: [{ sheet: 'Trials', cell: 'C2', text: '03/04/2026', answer: '2026-03-04' }] },
      ]),
    );
    expect(sent.find((request) => request.method === 'PUT')?.headers.get('If-Match')).toBe('"4"');
    stop();
  });

  it('says which outcomes a kept answer moved', async () => {
    const said = listenToAnnouncements();
    const answers: Record<string, unknown> = {
      [`PUT ${base}/answers`]: aReadingView({ version: 5 }),
      [`GET ${base}/check`]: aCheckView({ findings: [aFinding({ outcome: 'undecided' })] }),
    };
    const { client, stop } = await open(answers);
    await waitFor(() => expect(client.getQueryData(checkQuery(params).queryKey)).toBeDefined());
    answers[`GET ${base}/check`] = aCheckView({ findings: [aFinding({ outcome: 'fail' })] });
    press('2');
    await waitFor(() => expect(said).toContain('Checked again. Changed: one outcome, 412.03(b) fail.'));
    stop();
  });

  it('shows the answer at once, before the server has checked again', async () => {
    const { stop } = await open();
    vi.stubGlobal('fetch', () => new Promise(() => undefined));
    press('1');
    await waitFor(() =>
      expect(screen.getByRole<HTMLInputElement>('radio', { name: '3 April 2026' }).checked).toBe(true),
    );
    stop();
  });

  it('keeps showing an answer that waits for the one before it', async () => {
    const { stop } = await open();
    const answer = vi.fn<() => void>();
    vi.stubGlobal('fetch', (_input: string, init?: RequestInit) =>
      init?.method === 'PUT'
        ? new Promise<Response>((resolve) => {
            answer.mockImplementationOnce(() =>
              resolve(
                new Response(JSON.stringify(aReadingView({ version: 5 })), {
                  headers: { 'Content-Type': 'application/json' },
                }),
              ),
            );
          })
        : new Promise(() => undefined),
    );
    press('1');
    press('j');
    press('1');
    const second = () => screen.getByRole<HTMLInputElement>('radio', { name: '4721.5 g' });
    await waitFor(() => expect(second().checked).toBe(true));
    answer();
    await new Promise((resolve) => setTimeout(resolve, 20));
    expect(second().checked).toBe(true);
    stop();
  });

  it('stays at the doubt that was answered until J goes on', async () => {
    const { stop } = await open();
    vi.stubGlobal('fetch', () => new Promise(() => undefined));
    press('1');
    await waitFor(() =>
      expect(screen.getByRole<HTMLInputElement>('radio', { name: '3 April 2026' }).checked).toBe(true),
    );
    expect(selected()).toContain('03/04/2026');
    press('j');
    expect(selected()).toContain('4721,5');
    stop();
  });

  it('goes to the next doubt with J and answers that one', async () => {
    const { sent, stop } = await open({ [`PUT ${base}/answers`]: aReadingView({ version: 5 }) });
    press('j');
    expect(selected()).toContain('4721,5');
    press('1');
    await waitFor(() =>
      expect(kept(sent)).toEqual([
        { answers: [{ sheet: 'Trials', cell: 'C4', text: '4721,5', answer: '4721.5' }] },
      ]),
    );
    stop();
  });

  it('ignores a number that names no choice, and numbers away from a doubt', async () => {
    const { sent, stop } = await open();
    press('4');
    screen.getByRole('grid').focus();
    press('ArrowRight');
    press('1');
    expect(kept(sent)).toEqual([]);
    stop();
  });

  it('moves the cell cursor with the arrow keys and says what the cell was taken for', async () => {
    const { stop } = await open();
    screen.getByRole('grid').focus();
    press('ArrowRight');
    expect(selected()).toBe('edge chip');
    expect(screen.getByText('not used: A remark.')).toBeTruthy();
    press('ArrowUp');
    expect(selected()).toBe('');
    expect(screen.getByText('empty')).toBeTruthy();
    stop();
  });

  it('asks for a cell with G and goes there', async () => {
    const { stop } = await open();
    press('g');
    const input = screen.getByRole('textbox', { name: 'Cell to go to' });
    expect(document.activeElement).toBe(input);
    fireEvent.change(input, { target: { value: 'd2' } });
    fireEvent.keyDown(input, { key: 'Enter' });
    expect(selected()).toBe('edge chip');
    stop();
  });

  it('says why an answer was not kept and shows the present state again', async () => {
    const stale = aProblemResponse('version-stale', 412, { title: 'It has changed since you saw it' });
    const { stop } = await open({ [`PUT ${base}/answers`]: stale });
    press('1');
    const notice = await screen.findByRole('alert');
    expect(within(notice).getByText(/It has changed since you saw it/)).toBeTruthy();
    await waitFor(() =>
      expect(screen.getByRole<HTMLInputElement>('radio', { name: '3 April 2026' }).checked).toBe(false),
    );
    stop();
  });

  it('offers no answer to a reader who may not answer', async () => {
    const { sent, stop } = await open({}, aReadingView({ abilities: { answer: false, attach: false } }));
    press('1');
    expect(kept(sent)).toEqual([]);
    expect(screen.getByRole<HTMLInputElement>('radio', { name: '3 April 2026' }).disabled).toBe(true);
    expect(screen.queryByRole('button', { name: 'Add a certificate or report' })).toBeNull();
    stop();
  });

  it('names hidden sheets as hidden', async () => {
    const { stop } = await open();
    expect(screen.getByRole('link', { name: 'Lists (hidden)' })).toBeTruthy();
    stop();
  });
});
