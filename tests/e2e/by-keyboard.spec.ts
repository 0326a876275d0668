import { expect, type Locator, type Page, test } from '@playwright/test';
import { asPerson, expectAccessible } from './support';

const mix = 'BW-125-S6';
const note = 'The voids come close to the limit; tell us the spread of the plant.';

/** Walks on with Tab until the control has the focus, as a reader without a mouse has to. */
async function tabTo(page: Page, control: Locator): Promise<void> {
  await expect(control).toBeVisible();
  for (let steps = 0; steps < 250; steps += 1) {
    if (await control.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`${control} is not reached with Tab from ${page.url()}`);
}

async function pressOn(page: Page, control: Locator, key = 'Enter'): Promise<void> {
  await tabTo(page, control);
  await page.keyboard.press(key);
}

async function signInByKeyboard(page: Page, name: string): Promise<void> {
  await page.goto('/sign-in');
  await pressOn(page, page.getByRole('button', { name: new RegExp(name) }));
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

test('doubts are answered, a mix is submitted, annotated and handed on to sign without a mouse', async ({
  browser,
}) => {
  test.setTimeout(480_000);

  const manager = await asPerson(browser, null);
  await signInByKeyboard(manager, 'Dele Fairweather');
  await pressOn(manager, manager.getByRole('link', { name: `${mix} r0` }).first());
  await manager.waitForURL(/\/r\/0$/);
  await pressOn(manager, manager.getByRole('link', { name: 'How it was read' }));
  await manager.waitForURL(/\/r\/0\/reading/);
  await expect(manager.getByText('4 cells', { exact: true })).toBeVisible();
  for (const answered of [1, 2, 3, 4]) {
    await manager.keyboard.press('1');
    await expect(manager.getByRole('button', { name: 'Keep the answer' })).toBeVisible();
    await manager.keyboard.press('Enter');
    await expect(manager.getByText(`4 cells, ${answered} answered`)).toBeVisible();
  }
  await expectAccessible(manager);
  await manager.keyboard.press('Enter');
  await manager.waitForURL(/\/r\/0(#.*)?$/);
  await expect(manager.getByRole('heading', { name: new RegExp(mix) })).toBeVisible();

  await manager.keyboard.press('?');
  await expect(manager.getByRole('dialog', { name: 'Keys of this page' })).toBeVisible();
  await manager.keyboard.press('Escape');
  await expect(manager.getByRole('dialog')).toHaveCount(0);
  await manager.keyboard.press('j');
  await manager.keyboard.press('Enter');
  await expect(manager.locator('[data-row][aria-expanded=true]')).toHaveCount(1);
  await manager.keyboard.press('Enter');
  await expect(manager.locator('[data-row][aria-expanded=true]')).toHaveCount(0);

  await pressOn(manager, manager.getByRole('checkbox', { name: /I declare this/ }), 'Space');
  await pressOn(manager, manager.getByRole('button', { name: 'Submit revision 0' }).last());
  await expect(manager.getByText(/Received/).first()).toBeVisible();

  const reviewer = await asPerson(browser, null);
  await signInByKeyboard(reviewer, 'Ines Tordoff');
  await expect(reviewer.getByRole('heading', { name: /Review queue/ })).toBeVisible();
  await reviewer.keyboard.press('/');
  await reviewer.keyboard.type(mix);
  await expect(reviewer.getByRole('option', { name: new RegExp(mix) }).first()).toBeVisible();
  await reviewer.keyboard.press('ArrowDown');
  await reviewer.keyboard.press('Enter');
  await reviewer.waitForURL(/\/r\/0/);
  await pressOn(reviewer, reviewer.getByRole('button', { name: 'Take for review' }));
  await expect(reviewer.getByRole('button', { name: 'Give back' })).toBeVisible();
  await reviewer.keyboard.press('j');
  await reviewer.keyboard.press('n');
  await reviewer.keyboard.type(note);
  await pressOn(reviewer, reviewer.getByRole('button', { name: 'Keep the note' }));
  await expect(reviewer.getByText(note)).toBeVisible();

  await reviewer.keyboard.press('d');
  await reviewer.waitForURL(/\/return$/);
  await expect(reviewer.getByText(/page 1 of/)).toBeVisible({ timeout: 60_000 });
  await pressOn(reviewer, reviewer.getByRole('button', { name: /Send to Mairi Halloran/ }));
  await expect(reviewer.getByText(/Ready to sign/).first()).toBeVisible();
});
