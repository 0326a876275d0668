import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { expect, type Page, test } from '@playwright/test';
import { emptyPort, instanceDirectory } from './instances';
import { asPerson, expectAccessible } from './support';

const password = 'a long pass phrase of the first day';

test('an empty database gets its agency, people, contractor, project and section by screens alone', async ({
  browser,
}) => {
  test.setTimeout(300_000);
  const administrator = await asPerson(browser, null);
  await administrator.goto('/sign-in');
  await expect(administrator.getByText('People of the demo')).toHaveCount(0);
  const link = await setUpLink();
  await administrator.goto(link);
  await administrator.getByRole('textbox', { name: 'Name' }).first().fill('Mere Fen Roads Board');
  await administrator.getByRole('textbox', { name: 'Name' }).last().fill('Ada Quill');
  await administrator.getByRole('textbox', { name: 'E-mail address' }).fill('ada.quill@mere-fen.example');
  await administrator.getByRole('textbox', { name: 'Password' }).fill(password);
  await expectAccessible(administrator);
  await administrator.getByRole('button', { name: /^Set up|^Make/ }).click();
  await administrator.waitForURL((url) => !url.pathname.startsWith('/set-up'));

  await administrator.goto(link);
  await expect(administrator.getByText(/has been used|Nothing is here/).first()).toBeVisible();

  await administrator.goto('/settings');
  await administrator.getByRole('textbox', { name: 'Department' }).fill('Materials');
  await administrator.getByRole('textbox', { name: 'Address', exact: true }).fill('1 Sluice Lane, Mere');
  await expectAccessible(administrator);
  await administrator.getByRole('button', { name: /^Keep/ }).first().click();
  await expect(administrator.getByText(/kept|saved/i).first()).toBeVisible();

  await administrator.goto('/people');
  await expectAccessible(administrator);
  await administrator.getByRole('textbox', { name: 'Name', exact: true }).fill('Piers Holt');
  await administrator
    .getByRole('textbox', { name: 'E-mail address', exact: true })
    .fill('piers.holt@mere-fen.example');
  await administrator.getByText('reviewer', { exact: true }).last().click();
  await administrator.getByRole('button', { name: 'Send the invitation' }).first().click();
  await expect(administrator.getByText('piers.holt@mere-fen.example')).toBeVisible();
  await administrator.getByRole('textbox', { name: 'Name of the contractor' }).fill('Staithe Surfacing');
  await administrator.getByRole('textbox', { name: 'Administrator', exact: true }).fill('Nell Rowan');
  await administrator
    .getByRole('textbox', { name: /Administrator.s e-mail/ })
    .fill('nell.rowan@staithe.example');
  await administrator.getByRole('button', { name: 'Add the contractor' }).last().click();
  await expect(administrator.getByText('Staithe Surfacing').first()).toBeVisible();

  await administrator.goto('/projects/new');
  await administrator.getByRole('textbox', { name: 'Contract number' }).fill('MF-7');
  await administrator.getByRole('textbox', { name: 'Title' }).fill('Sluice Lane');
  await administrator.locator('input[type=date]').fill('2026-02-02');
  await administrator.getByText('Staithe Surfacing').click();
  await expectAccessible(administrator);
  await administrator
    .getByRole('button', { name: /^Make|^Add/ })
    .last()
    .click();
  await administrator.waitForURL(/\/projects\/[0-9a-f-]{36}/);
  await expect(administrator.getByRole('heading', { name: /MF-7|Sluice Lane/ })).toBeVisible();
  await administrator
    .getByRole('button', { name: /^Confirm/ })
    .first()
    .click();
  await expect(administrator.getByText(/Template/).first()).toBeVisible();
  await expectAccessible(administrator);

  const contractor = await asPerson(browser, null);
  await contractor.goto(await invitationLink(administrator, 'nell.rowan@staithe.example'));
  await contractor.getByRole('textbox', { name: 'Password' }).fill(password);
  await expectAccessible(contractor);
  await contractor.getByRole('button', { name: /Accept|Join/ }).click();
  await contractor.waitForURL((url) => !url.pathname.startsWith('/invitation'));
  await contractor.goto('/projects');
  await expect(contractor.getByText('MF-7').first()).toBeVisible();
});

/** The link is printed once by the start, and stands nowhere else. */
async function setUpLink(): Promise<string> {
  const welcome = await readFile(join(instanceDirectory(emptyPort), 'welcome.txt'), 'utf8');
  const link = /http\S+\/set-up\/\S+/.exec(welcome)?.[0];
  if (link === undefined) throw new Error(`The start printed no set-up link:\n${welcome}`);
  return link;
}

async function invitationLink(page: Page, recipient: string): Promise<string> {
  let link: string | undefined;
  await expect
    .poll(async () => {
      const { mails } = await (await page.request.get('/api/caught-mail')).json();
      const mail = mails.find(({ to }: { to: string[] }) => to.includes(recipient));
      if (mail === undefined) return false;
      const { text } = await (await page.request.get(`/api/caught-mail/${mail.id}`)).json();
      link = /http\S+\/invitations?\/\S+/.exec(text)?.[0];
      return link !== undefined;
    })
    .toBe(true);
  return link ?? '';
}
