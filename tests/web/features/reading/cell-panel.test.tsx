// @vitest-environment happy-dom
import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aReadingView } from '#tests/builders/a-reading-view';
import { aProblemResponse } from '../../render-page';
import { aPreview, base, openReading } from './open-reading';

const press = (key: string, more: Record<string, boolean> = {}) =>
  fireEvent.keyDown(document.activeElement ?? document.body, { key, ...more });
const preview = `POST ${base}/reading/preview`;
const corrections = `POST ${base}/reading/corrections`;
const heading = (name: string) => screen.findByRole('heading', { name });
const bodies = (sent: Awaited<ReturnType<typeof openReading>>['sent'], path: string) =>
  sent.filter((request) => request.path.endsWith(path)).map(({ body }) => body);

/** One act is done after the other, so a button waits for the act before it. */
async function pressWhenAble(name: string) {
  const button = () => screen.getByRole<HTMLButtonElement>('button', { name });
  await waitFor(() => expect(button().disabled).toBe(false));
  fireEvent.click(button());
}

const said = {
  sheet: 'Trials',
  range: 'C2',
  says: { kind: 'not a reading' },
};
const correction = {
  ...said,
  id: '0192f0a0-0000-7000-8000-0000000000c1',
  by: 'Dele Fairweather',
  at: '2026-03-09T10:00:00.000Z',
};
const corrected = () =>
  aReadingView({ version: 5, corrections: [{ ...correction, says: { kind: 'not a reading' } }] });

/** Opens the panel at the cursor with the key of the grid. */
async function ask(answers: Record<string, unknown> = {}, reading = aReadingView()) {
  const page = await openReading(Object.assign(answers, { [preview]: aPreview }), reading);
  screen.getByRole('grid').focus();
  press('Enter');
  return page;
}

describe('what a cell is', () => {
  it('is asked with Enter on the cell, and told with what it may mean', async () => {
    const { stop } = await ask();
    await heading('What is C2?');
    expect(screen.getByText(/May be 3 april 2026 or 4 march 2026 or leave out/)).toBeTruthy();
    stop();
  });

  it('is asked of a block that Shift and arrows choose', async () => {
    const { stop } = await openReading({ [preview]: aPreview });
    screen.getByRole('grid').focus();
    press('ArrowDown', { shiftKey: true });
    press('ArrowRight', { shiftKey: true });
    expect(screen.getAllByRole('gridcell', { selected: true }).length).toBe(4);
    press('Enter');
    await heading('What are C2:D3?');
    stop();
  });

  it('is asked of a block that is dragged over, or typed by who cannot drag', async () => {
    const { stop } = await openReading({ [preview]: aPreview });
    const place = (text: string) => {
      const found = screen.getAllByRole('gridcell').find(({ textContent }) => textContent?.includes(text));
      if (!found) throw new Error(`no cell says ${text}`);
      return found;
    };
    fireEvent.pointerDown(place('03/04/2026'), { pointerType: 'mouse', button: 0, buttons: 1 });
    fireEvent.pointerOver(place('4721,5'), { pointerType: 'mouse', buttons: 1 });
    fireEvent.pointerUp(place('4721,5'), { pointerType: 'mouse' });
    fireEvent.click(screen.getByRole('button', { name: 'Say what they are' }));
    await heading('What are C2:C4?');
    const cells = screen.getByRole('textbox', { name: 'Cells' });
    fireEvent.change(cells, { target: { value: 'd2:c2' } });
    fireEvent.blur(cells);
    await heading('What are C2:D2?');
    stop();
  });

  it('is kept for the whole block only after what it changes was shown', async () => {
    const { sent, stop } = await ask({ [corrections]: corrected() });
    fireEvent.click(await screen.findByRole('radio', { name: 'not a reading' }));
    await screen.findByText('412.03(b)');
    expect(bodies(sent, '/preview')).toEqual([{ answers: [], corrections: [said], typed: [], takeBack: [] }]);
    expect(bodies(sent, '/corrections')).toEqual([]);
    fireEvent.click(screen.getByRole('button', { name: 'Keep it' }));
    await screen.findByRole('heading', { name: 'Said by people' });
    expect(bodies(sent, '/corrections')).toEqual([{ corrections: [said] }]);
    expect(screen.getByText('is not a reading')).toBeTruthy();
    stop();
  });

  it('is a quantity found by what workbooks call it, with the conditions that it needs', async () => {
    const { sent, stop } = await ask();
    fireEvent.click(await screen.findByRole('radio', { name: 'readings of a quantity' }));
    const quantity = screen.getByRole('combobox', { name: 'Quantity' });
    quantity.focus();
    fireEvent.change(quantity, { target: { value: 'bulk sg' } });
    fireEvent.click(await screen.findByRole('option', { name: /bulk specific gravity of the mix/ }));
    await waitFor(() =>
      expect(bodies(sent, '/preview').at(-1)).toMatchObject({
        corrections: [{ says: { kind: 'reading', quantity: 'bulk-specific-gravity-of-mix', unit: null } }],
      }),
    );
    expect(screen.getByRole('button', { name: /Trial/ })).toBeTruthy();
    stop();
  });

  it('is undone and said again', async () => {
    const answers: Record<string, unknown> = { [corrections]: corrected() };
    const { sent, stop } = await ask(answers);
    fireEvent.click(await screen.findByRole('radio', { name: 'not a reading' }));
    fireEvent.click(await screen.findByRole('button', { name: 'Keep it' }));
    answers[`POST ${base}/reading/acts/${correction.id}/withdrawal`] = aReadingView({ version: 6 });
    await pressWhenAble('Undo what C2 is');
    answers[corrections] = corrected();
    await pressWhenAble('Do what C2 is again');
    await screen.findByText('is not a reading');
    expect(bodies(sent, '/corrections')).toEqual([{ corrections: [said] }, { corrections: [said] }]);
    expect(bodies(sent, '/withdrawal')).toEqual([{}]);
    stop();
  });

  it('stays open with what was chosen where keeping was refused', async () => {
    const { stop } = await ask({ [corrections]: aProblemResponse('version-stale', 412) });
    fireEvent.click(await screen.findByRole('radio', { name: 'not a reading' }));
    fireEvent.click(await screen.findByRole('button', { name: 'Keep it' }));
    await screen.findByRole('alert');
    expect(screen.getByRole<HTMLInputElement>('radio', { name: 'not a reading' }).checked).toBe(true);
    stop();
  });

  it('is left as it is with Escape, and the grid has the focus again', async () => {
    const { sent, stop } = await ask();
    const panel = await heading('What is C2?');
    fireEvent.keyDown(panel, { key: 'Escape' });
    await waitFor(() => expect(screen.queryByRole('heading', { name: 'What is C2?' })).toBeNull());
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('grid')));
    expect(bodies(sent, '/corrections')).toEqual([]);
    stop();
  });

  it('is not asked of a reader who may not say', async () => {
    const reading = aReadingView({ abilities: { answer: false, attach: false } });
    const { stop } = await ask({}, reading);
    expect(screen.queryByRole('heading', { name: 'What is C2?' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Say what it is' })).toBeNull();
    stop();
  });
});
