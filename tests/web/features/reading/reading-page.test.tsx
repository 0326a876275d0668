// @vitest-environment happy-dom
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { aCheckView } from '#tests/builders/a-check-view';
import { aFinding } from '#tests/builders/a-finding';
import { aReadingView } from '#tests/builders/a-reading-view';
import { checkQuery } from '../../../../web/lib/queries/check-query';
import { aProblemResponse, listenToAnnouncements } from '../../render-page';
import { aPreview, base, openReading as open, params } from './open-reading';

/** Proposes the choice that a number names for the doubt at the cursor, and keeps it. */
const answer = (key: string) => {
  press(key);
  press('Enter');
};
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

  it('shows what an answer would change before it is kept', async () => {
    const { sent, stop } = await open({ [`POST ${base}/reading/preview`]: aPreview });
    press('2');
    expect(await screen.findByText('412.03(b)')).toBeTruthy();
    expect(screen.getByText('One reading changes.')).toBeTruthy();
    expect(sent.filter(({ method }) => method === 'POST').map(({ body }) => body)).toEqual([
      {
        answers: [{ sheet: 'Trials', cell: 'C2', text: '03/04/2026', answer: '2026-03-04' }],
        corrections: [],
        typed: [],
        takeBack: [],
      },
    ]);
    expect(kept(sent)).toEqual([]);
    stop();
  });

  it('leaves a proposed answer with Escape', async () => {
    const { sent, stop } = await open({ [`POST ${base}/reading/preview`]: aPreview });
    press('2');
    await screen.findByRole('button', { name: 'Keep the answer' });
    press('Escape');
    await waitFor(() => expect(screen.queryByRole('button', { name: 'Keep the answer' })).toBeNull());
    expect(kept(sent)).toEqual([]);
    stop();
  });

  it('keeps the answer that a number key proposed with Enter, for the version that was seen', async () => {
    const answered = aReadingView({ version: 5 });
    const { sent, stop } = await open({ [`PUT ${base}/answers`]: answered });
    answer('2');
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
    answer('2');
    await waitFor(() => expect(said).toContain('Checked again. Changed: one outcome, 412.03(b) fail.'));
    stop();
  });

  it('shows the answer at once, before the server has checked again', async () => {
    const { stop } = await open();
    vi.stubGlobal('fetch', () => new Promise(() => undefined));
    answer('1');
    await waitFor(() => expect(screen.getByText('2 cells, 1 answered')).toBeTruthy());
    stop();
  });

  it('keeps showing an answer that waits for the one before it', async () => {
    const { stop } = await open();
    const release = vi.fn<() => void>();
    vi.stubGlobal('fetch', (_input: string, init?: RequestInit) =>
      init?.method === 'PUT'
        ? new Promise<Response>((resolve) => {
            release.mockImplementationOnce(() =>
              resolve(
                new Response(JSON.stringify(aReadingView({ version: 5 })), {
                  headers: { 'Content-Type': 'application/json' },
                }),
              ),
            );
          })
        : new Promise(() => undefined),
    );
    answer('1');
    answer('1');
    await waitFor(() => expect(screen.getByText('2 cells, 2 answered')).toBeTruthy());
    release();
    await new Promise((resolve) => setTimeout(resolve, 20));
    expect(screen.getByRole<HTMLInputElement>('radio', { name: '4721.5 g' }).checked).toBe(true);
    stop();
  });

  it('goes on to the next doubt without an answer once one is kept', async () => {
    const { stop } = await open();
    vi.stubGlobal('fetch', () => new Promise(() => undefined));
    press('1');
    expect(selected()).toContain('03/04/2026');
    press('Enter');
    await waitFor(() => expect(selected()).toContain('4721,5'));
    stop();
  });

  it('takes a kept answer back with U and gives it again with R', async () => {
    const answered = (answer: string | null, version: number) => {
      const [first, ...others] = aReadingView().doubts;
      return aReadingView({ version, doubts: first ? [{ ...first, answer }, ...others] : others });
    };
    const answers: Record<string, unknown> = { [`PUT ${base}/answers`]: answered('2026-03-04', 5) };
    const { sent, stop } = await open(answers);
    answer('2');
    await screen.findByRole('button', { name: 'Undo the answer at Trials C2' });
    answers[`PUT ${base}/answers`] = answered(null, 6);
    press('u');
    await screen.findByRole('button', { name: 'Do the answer at Trials C2 again' });
    answers[`PUT ${base}/answers`] = answered('2026-03-04', 7);
    press('r');
    await screen.findByRole('button', { name: 'Undo the answer at Trials C2' });
    const given = { sheet: 'Trials', cell: 'C2', text: '03/04/2026' };
    expect(kept(sent)).toEqual([
      { answers: [{ ...given, answer: '2026-03-04' }] },
      { answers: [{ ...given, answer: null }] },
      { answers: [{ ...given, answer: '2026-03-04' }] },
    ]);
    stop();
  });

  it('goes to the next doubt with J and answers that one', async () => {
    const { sent, stop } = await open({ [`PUT ${base}/answers`]: aReadingView({ version: 5 }) });
    press('j');
    expect(selected()).toContain('4721,5');
    answer('1');
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
    answer('1');
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
    expect(screen.queryByRole('button', { name: 'Keep the answer' })).toBeNull();
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
