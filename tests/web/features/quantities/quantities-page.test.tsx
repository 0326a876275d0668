// @vitest-environment happy-dom
import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { allQuantities } from '#rules/quantities/registry';
import { QuantitiesPage } from '../../../../web/features/quantities/components/quantities-page';
import { renderPage } from '../../render-page';

const open = (at = '/quantities') => renderPage(<QuantitiesPage />, { path: '/quantities', at });
const rowOf = (id: string) => {
  const row = document.getElementById(id);
  if (row === null) throw new Error(`no row ${id}`);
  return row;
};

describe('the page of quantities', () => {
  it('lists every quantity of the registry', () => {
    open();
    for (const { id } of allQuantities()) expect(rowOf(id).tagName).toBe('TR');
    expect(screen.getByRole('status').textContent).toBe(`${allQuantities().length} quantities`);
  });

  it('gives symbol, units, plausible range, methods, formula and source', () => {
    open();
    const voids = rowOf('air-voids').textContent ?? '';
    for (const text of ['Air voids', '0 to 28', 'one decimal', 'AASHTO T 269', 'AASHTO R 35']) {
      expect(voids).toContain(text);
    }
    expect(rowOf('air-voids').querySelector('.fraction')).not.toBeNull();
    const flow = rowOf('marshall-flow').textContent ?? '';
    for (const text of ['mm', 'or 0.01 in, 0.25 mm, in', 'as tested or stated']) expect(flow).toContain(text);
    expect(rowOf('creep-compliance').textContent).toContain('with its temperature, loading time');
    expect(rowOf('air-voids').textContent).toContain('from memory, verify');
  });

  it('folds away how workbooks write each, in four languages', () => {
    open();
    const folded = rowOf('sand-equivalent').querySelector('details');
    expect(folded?.open).toBe(false);
    expect(folded?.querySelector('summary')?.textContent).toMatch(/names in workbooks$/);
    for (const name of ['equivalent de sable', 'equivalente de arena']) {
      expect(folded?.textContent).toContain(name);
    }
  });

  it('says once that methods are from memory and ranges are no limits', () => {
    open();
    expect(screen.getByText(/are from memory: verify/).textContent).toContain('never failed for it');
  });

  it('narrows to what is typed, says how many, and keeps it in the address', async () => {
    const { router } = open();
    fireEvent.change(screen.getByLabelText('Find a quantity'), { target: { value: 'rice gravity' } });
    expect(await screen.findByText('written as “Rice gravity”')).toBeTruthy();
    expect(screen.getByRole('status').textContent).toMatch(/^[a-z]+ quantit(y|ies) of \d+$/);
    expect(document.getElementById('sand-equivalent')).toBeNull();
    expect(router.state.location.search).toBe('?q=rice+gravity');
  });

  it('finds what its address asks for', () => {
    open('/quantities?q=marshall');
    expect(within(screen.getByRole('region', { name: 'Mix' })).getAllByRole('row').length).toBeGreaterThan(1);
    expect(document.getElementById('sand-equivalent')).toBeNull();
  });

  it('offers all again where nothing is called that', async () => {
    open('/quantities?q=zzz');
    fireEvent.click(screen.getByRole('link', { name: 'show all quantities' }));
    expect((await screen.findAllByRole('table')).length).toBe(4);
  });

  it('puts the focus on the quantity that its address names', () => {
    open('/quantities#marshall-stability');
    expect(document.activeElement).toBe(rowOf('marshall-stability'));
  });
});
