// @vitest-environment happy-dom
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { allQuantities } from '#rules/quantities/registry';
import { QuantitiesPage } from '../../../../web/features/quantities/components/quantities-page';
import { renderPage } from '../../render-page';

// The whole registry is a long page to render on a busy machine.
vi.setConfig({ testTimeout: 20_000 });

const open = (search: string) =>
  renderPage(<QuantitiesPage />, { path: '/quantities', at: `/quantities${search}` });
const rowOf = (id: string) => {
  const row = document.getElementById(id);
  if (row === null) throw new Error(`no row ${id}`);
  return row;
};

describe('the page of quantities', () => {
  it('lists every quantity of the registry', () => {
    open('');
    for (const { id } of allQuantities()) expect(rowOf(id).tagName).toBe('TR');
    const count = `${allQuantities().length} quantities`;
    expect(document.querySelector('[role="status"]')?.textContent).toBe(count);
  });

  it('gives symbol, plausible range, methods, formula and source', () => {
    open('?q=air-voids');
    const voids = rowOf('air-voids');
    for (const text of ['Air voids', '0 to 28', 'one decimal', 'AASHTO T 269', 'AASHTO R 35']) {
      expect(voids.textContent).toContain(text);
    }
    expect(voids.querySelector('.fraction')).not.toBeNull();
    expect(voids.textContent).toContain('from memory, verify');
  });

  it('gives the units that a workbook may use, and the conditions that a reading needs', () => {
    open('?q=marshall-flow');
    const flow = rowOf('marshall-flow').textContent ?? '';
    for (const text of ['mm', 'or 0.01 in, 0.25 mm, in', 'as tested or stated']) expect(flow).toContain(text);
    open('?q=creep-compliance');
    expect(rowOf('creep-compliance').textContent).toContain('with its temperature, loading time');
  });

  it('folds away how workbooks write each, in four languages', () => {
    open('?q=sand-equivalent');
    const folded = rowOf('sand-equivalent').querySelector('details');
    expect(folded?.open).toBe(false);
    expect(folded?.querySelector('summary')?.textContent).toMatch(/names in workbooks$/);
    for (const name of ['equivalent de sable', 'equivalente de arena']) {
      expect(folded?.textContent).toContain(name);
    }
  });

  it('says once that methods are from memory and ranges are no limits', () => {
    open('?q=marshall');
    expect(screen.getByText(/are from memory: verify/).textContent).toContain('never failed for it');
  });

  it('narrows to what is typed, says how many, and keeps it in the address', async () => {
    const { router } = open('?q=marshall');
    fireEvent.change(screen.getByLabelText('Find a quantity'), { target: { value: 'rice gravity' } });
    expect(await screen.findByText('written as “Rice gravity”')).toBeTruthy();
    expect(screen.getByRole('status').textContent).toMatch(/^[a-z]+ quantit(y|ies) of \d+$/);
    expect(document.getElementById('marshall-flow')).toBeNull();
    expect(router.state.location.search).toBe('?q=rice+gravity');
  });

  it('finds what its address asks for', () => {
    open('?q=marshall');
    expect(within(screen.getByRole('region', { name: 'Mix' })).getAllByRole('row').length).toBeGreaterThan(1);
    expect(document.getElementById('sand-equivalent')).toBeNull();
  });

  it('offers all again where nothing is called that', async () => {
    open('?q=zzz');
    fireEvent.click(screen.getByRole('link', { name: 'show all quantities' }));
    await waitFor(() => expect(document.querySelectorAll('table')).toHaveLength(4));
  });

  it('puts the focus on the quantity that its address names', () => {
    open('?q=marshall#marshall-stability');
    expect(document.activeElement).toBe(rowOf('marshall-stability'));
  });
});
