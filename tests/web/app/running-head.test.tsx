// @vitest-environment happy-dom
import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession } from '#tests/builders/a-session';
import { RunningHead } from '../../../web/app/shell/running-head';
import { renderPage, stubServer } from '../render-page';

const results = [
  { kind: 'submittal', title: 'BW-125-S4 r1', detail: 'Hollin Ridge Road', href: '/submittals/1/r/1' },
  { kind: 'clause', title: '412.03(d)', detail: 'Dust proportion', href: '/rule-sets/cvra-412/2026#rule-dp' },
];

async function open(found: unknown[] = results) {
  stubServer({ 'GET /api/session': aSession(), 'GET /api/search': { results: found } });
  const page = renderPage(<RunningHead />, { path: '/', at: '/' });
  return { ...page, field: await screen.findByLabelText('Find a mix, clause or project') };
}

describe('the running head', () => {
  it('takes the cursor to the search field with a stroke', async () => {
    const { field, stop } = await open();
    fireEvent.keyDown(document.body, { key: '/' });
    expect(document.activeElement).toBe(field);
    stop();
  });

  it('lists what is found by kind and opens the chosen one', async () => {
    const { field, router, stop } = await open();
    fireEvent.focus(field);
    fireEvent.change(field, { target: { value: 'dust' } });
    expect((await screen.findAllByRole('option')).map((option) => option.textContent)).toEqual([
      'BW-125-S4 r1Hollin Ridge Road',
      '412.03(d)Dust proportion',
    ]);
    fireEvent.keyDown(field, { key: 'ArrowDown' });
    fireEvent.keyDown(field, { key: 'Enter' });
    expect(router.state.location.pathname).toBe('/rule-sets/cvra-412/2026');
    expect(router.state.location.hash).toBe('#rule-dp');
    stop();
  });

  it('says what it looked through where it finds nothing', async () => {
    const { field, stop } = await open([]);
    fireEvent.focus(field);
    fireEvent.change(field, { target: { value: 'granite' } });
    expect(await screen.findByText(/Nothing is called “granite”/)).toBeTruthy();
    stop();
  });

  it('opens the menu of the person once it is asked for', async () => {
    const { stop } = await open();
    const button = screen.getByRole('button', { name: 'Ines Tordoff' });
    expect(button.getAttribute('aria-haspopup')).toBe('menu');
    fireEvent.click(button);
    // The menu is a chunk of its own, which a cold run transforms first.
    expect(await screen.findByRole('menuitem', { name: 'Sign out' }, { timeout: 15_000 })).toBeTruthy();
    fireEvent.click(screen.getByRole('menuitemradio', { name: /Dark/ }));
    expect(document.documentElement.dataset.theme).toBe('dark');
    expect(localStorage.getItem('clauseway.theme')).toBe('dark');
    delete document.documentElement.dataset.theme;
    stop();
  }, 20_000);
});
