import { expect, type Locator, type Page, test } from '@playwright/test';
import { asPerson, expectAccessible, expectNoSidewaysScroll } from './support';

const edition = '2028';
const printed = 'under 3\t40\n3 to under 30\t45\n30 and over\t50';

/** A click, a filled field, a pressed key: what an author has to do, counted. */
function counted(page: Page) {
  let done = 0;
  const act = async (run: () => Promise<unknown>) => {
    done += 1;
    await run();
  };
  return {
    count: () => done,
    click: (on: Locator) => act(() => on.click()),
    fill: (field: Locator, text: string) => act(() => field.fill(text)),
    choose: async (name: string, option: string | RegExp) => {
      await act(() => page.getByRole('button', { name }).click());
      await act(() => page.getByRole('option', { name: option }).click());
    },
    press: (key: string) => act(() => page.keyboard.press(key)),
  };
}

test('a rule is written with its table, reviewed by a second author and published', async ({ browser }) => {
  test.setTimeout(480_000);
  const author = await asPerson(browser, 'Tamsin Brook');
  await author.goto('/rule-sets');
  await author.getByRole('link', { name: 'Begin a draft' }).click();
  await author.getByRole('button', { name: /Edition/ }).click();
  await author.getByRole('option', { name: /Section 412 .*, 2026/ }).click();
  await author.getByRole('textbox', { name: 'Name of the edition' }).fill(edition);
  await expectAccessible(author);
  await author.getByRole('button', { name: 'Begin the draft' }).click();
  await author.waitForURL(/\/drafts\//);
  await author.getByLabel('In force from').fill('2028-01-01');
  const draftUrl = author.url();

  const work = counted(author);
  await work.click(author.getByRole('button', { name: 'Add a table' }));
  // The title of the draft is called the same, and may still be in sight.
  await work.fill(author.getByRole('textbox', { name: 'Looked up by' }), 'designTraffic');
  await work.fill(
    author.getByRole('textbox', { name: 'Title' }),
    'Table 412-20 (sand equivalent by traffic)',
  );
  await work.click(author.getByRole('button', { name: 'Paste from a spreadsheet' }));
  await work.fill(author.getByRole('textbox', { name: /Rows from a spreadsheet/ }), printed);
  await work.click(author.getByRole('button', { name: 'Put the rows in' }));
  await expect(author.getByRole('textbox', { name: 'designTraffic, row 2' })).toHaveValue('3 to under 30');
  await expect(author.getByRole('textbox', { name: 'min, %, row 3' })).toHaveValue('50');
  await expectAccessible(author);
  await work.click(author.getByRole('link', { name: `Draft ${edition}` }));
  await work.click(author.getByRole('button', { name: 'Add a rule' }));
  await work.fill(author.getByRole('textbox', { name: 'Clause' }), '412.02(n)');
  await work.fill(author.getByRole('textbox', { name: 'Title', exact: true }), 'Sand equivalent by traffic');
  await work.fill(author.getByRole('combobox', { name: 'Quantity' }), 'sand equivalent');
  await work.click(author.getByRole('option', { name: /sand equivalent/ }).first());
  await work.choose('at least: where it is', 'from a table');
  await work.choose('at least: table', /Table 412-20/);
  await expect(
    author.getByText(/Sand equivalent .*is at least the value in Table 412-20/).first(),
  ).toBeVisible();
  await expect(author.getByRole('button', { name: 'at least: column' })).toHaveText(/min/);
  expect(work.count()).toBeLessThan(40);
  await expect(author.getByText(/^saved/).first()).toBeVisible();
  await expectAccessible(author);
  await author.keyboard.press('Control+z');
  await expect(author.getByRole('button', { name: 'at least: table' })).not.toHaveText(/412-20/);
  await author.keyboard.press('Control+y');
  await expect(author.getByRole('button', { name: 'at least: table' })).toHaveText(/412-20/);

  await author.reload();
  await expect(author.getByRole('button', { name: 'at least: table' })).toHaveText(/412-20/);
  await author.setViewportSize({ width: 390, height: 844 });
  await expectNoSidewaysScroll(author);
  await author.setViewportSize({ width: 1440, height: 900 });

  await author.goto(draftUrl);
  await author.getByRole('link', { name: 'Compare with 2026' }).click();
  await expect(
    author.getByRole('heading', { name: /412\.02\(n\) Sand equivalent by traffic/ }),
  ).toBeVisible();
  await expectAccessible(author);
  await author.goto(draftUrl);
  await author.getByRole('button', { name: 'Send for review' }).click();
  await expect(author.getByText('You sent it for review')).toBeVisible();

  const second = await asPerson(browser, 'Joaquim Vale');
  await second.goto(draftUrl);
  await second.getByRole('checkbox', { name: /Sand equivalent by traffic says/ }).press('Space');
  await expect(second.getByText('1 of 56 rules verified')).toBeVisible();
  await expect(second.getByRole('textbox', { name: 'Why with its warnings' })).toBeVisible({
    timeout: 120_000,
  });
  await second
    .getByRole('textbox', { name: 'Why with its warnings' })
    .fill('Held against the printed table.');
  await expectAccessible(second);
  await second.getByRole('button', { name: 'Publish' }).click();
  await second.waitForURL(new RegExp(`/rule-sets/cvra-412/${edition}$`), { timeout: 60_000 });
  await expect(second.getByText(/not yet in force/).first()).toBeVisible();
  await expect(second.getByText('Sand equivalent by traffic').first()).toBeVisible();

  const reviewer = await asPerson(browser, 'Ines Tordoff');
  await reviewer.goto('/rule-sets');
  await expect(reviewer.getByRole('link', { name: 'Begin a draft' })).toHaveCount(0);
});
