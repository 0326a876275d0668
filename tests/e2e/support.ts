import AxeBuilder from '@axe-core/playwright';
import { type Browser, expect, type Page } from '@playwright/test';

/** A page of its own for one person; whatever it prints or breaks fails the journey. */
export async function asPerson(browser: Browser, name: string | null): Promise<Page> {
  const context = await browser.newContext();
  const page = await context.newPage();
  page.on('pageerror', (error) => {
    throw error;
  });
  page.on('response', (response) => {
    if (response.status() >= 500) throw new Error(`${response.status()} from ${response.url()}`);
  });
  page.on('console', (message) => {
    // The browser's own word on an answer of 4xx, which some steps provoke.
    if (message.text().startsWith('Failed to load resource')) return;
    if (message.type() === 'error' || message.type() === 'warning') {
      throw new Error(`unexpected console ${message.type()}: ${message.text()}`);
    }
  });
  if (name !== null) {
    await page.goto('/sign-in');
    await page.getByRole('button', { name: new RegExp(name) }).click();
    await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  }
  return page;
}

/** No violation of WCAG 2.2 AA, light and dark. */
export async function expectAccessible(page: Page): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    const { violations } = await new AxeBuilder({ page })
      // What was announced for a control that has gone since; it clears itself after a few seconds.
      .exclude('[data-live-announcer]')
      .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
      .analyze();
    const told = violations.map(
      ({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`,
    );
    expect(told, `${page.url()} in ${colorScheme}`).toEqual([]);
  }
  await page.emulateMedia({ colorScheme: null });
}

/** The page itself never scrolls sideways. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const { scrollWidth, clientWidth } = await page.evaluate(() => ({
    scrollWidth: document.documentElement.scrollWidth,
    clientWidth: document.documentElement.clientWidth,
  }));
  expect(scrollWidth, page.url()).toBeLessThanOrEqual(clientWidth);
}
