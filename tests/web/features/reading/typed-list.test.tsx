// @vitest-environment happy-dom
import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aReadingView } from '#tests/builders/a-reading-view';
import { aPreview, base, openReading } from './open-reading';

const id = '0192f0a0-0000-7000-8000-0000000000d1';
const aTyped = (value: number, overruled: string | null = null) => ({
  id,
  reading: {
    quantity: 'air-voids',
    value,
    unit: '%',
    at: {},
    origin: 'typed' as const,
    typed: { by: 'Dele Fairweather', on: '2026-03-09' },
    source: null,
  },
  label: 'air voids',
  overruled,
  by: 'Dele Fairweather',
  at: '2026-03-09T10:00:00.000Z',
});
const withTyped = (value: number, overruled: string | null = null) =>
  aReadingView({ version: 5, typed: [aTyped(value, overruled)] });
const typedPath = `POST ${base}/reading/typed`;
const withdrawal = `POST ${base}/reading/acts/${id}/withdrawal`;
const bodies = (sent: Awaited<ReturnType<typeof openReading>>['sent'], path: string) =>
  sent.filter((request) => request.path.endsWith(path)).map(({ body }) => body);
const preview = { [`POST ${base}/reading/preview`]: aPreview };
const reading = { quantity: 'air-voids', qualifier: null, unit: '%', at: {}, method: null, testedOn: null };

describe('typed readings', () => {
  it('are entered with quantity, value and unit, shown before they are kept, and told with who typed them', async () => {
    const { sent, stop } = await openReading({ ...preview, [typedPath]: withTyped(4.2) });
    fireEvent.click(screen.getByRole('button', { name: 'Type a reading' }));
    const quantity = await screen.findByRole('combobox', { name: 'Quantity' });
    quantity.focus();
    fireEvent.change(quantity, { target: { value: 'va' } });
    fireEvent.click(await screen.findByRole('option', { name: /air voids/ }));
    fireEvent.change(await screen.findByRole('textbox', { name: 'Value' }), { target: { value: '4.2' } });
    await screen.findByText('412.03(b)');
    fireEvent.click(screen.getByRole('button', { name: 'Keep it as typed' }));
    await screen.findByText(/typed by Dele Fairweather, 9 March 2026/);
    expect(bodies(sent, '/reading/typed')).toEqual([{ readings: [{ ...reading, value: 4.2 }] }]);
    stop();
  });

  it('are changed by taking the old one back and typing the new one', async () => {
    const { sent, stop } = await openReading(
      { ...preview, [withdrawal]: aReadingView({ version: 6 }), [typedPath]: withTyped(4.4) },
      withTyped(4.2),
    );
    fireEvent.click(screen.getByRole('button', { name: 'Change air voids' }));
    const value = await screen.findByRole<HTMLInputElement>('textbox', { name: 'Value' });
    expect(value.value).toBe('4.2');
    fireEvent.change(value, { target: { value: '4.4' } });
    fireEvent.click(await screen.findByRole('button', { name: 'Keep the change' }));
    await waitFor(() =>
      expect(bodies(sent, '/reading/typed')).toEqual([{ readings: [{ ...reading, value: 4.4 }] }]),
    );
    expect(bodies(sent, '/withdrawal')).toEqual([{}]);
    stop();
  });

  it('are withdrawn after what that changes was shown', async () => {
    const { sent, stop } = await openReading(
      { ...preview, [withdrawal]: aReadingView({ version: 6 }) },
      withTyped(4.2),
    );
    fireEvent.click(screen.getByRole('button', { name: 'Withdraw air voids' }));
    await screen.findByText('412.03(b)');
    expect(bodies(sent, '/preview')).toEqual([{ answers: [], corrections: [], typed: [], takeBack: [id] }]);
    fireEvent.click(screen.getByRole('button', { name: 'Withdraw it' }));
    await waitFor(() => expect(bodies(sent, '/withdrawal')).toEqual([{}]));
    stop();
  });

  it('say why they do not count where the workbook states the same', async () => {
    const { stop } = await openReading({}, withTyped(4.2, 'Trials I9 gives 4.1 %.'));
    expect(screen.getByText(/It does not count/).textContent).toContain('Trials I9 gives 4.1 %.');
    stop();
  });
});
