import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, type Page, test } from '@playwright/test';
import exceljs from 'exceljs';
import { demoPort, instanceDirectory } from './instances';
import { asPerson, expectAccessible, expectNoSidewaysScroll } from './support';

const mix = 'BW-125-J1';
const internalWord = 'Tollhouse sent last year’s report; ask quietly.';
const answerWord = 'V20 now divides by the effective binder.';
const returnedWord = 'The ratio divides by total binder. Please correct V20.';

/** As the start wrote it for people to upload by hand. */
async function workbook(name: string): Promise<{ name: string; mimeType: string; buffer: Buffer }> {
  return {
    name,
    mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    buffer: await readFile(join(instanceDirectory(demoPort), 'demo-workbooks', name)),
  };
}

/** Opens the row of a clause and writes a note on it. */
async function writeNote(
  page: Page,
  { clause, text, kind }: { clause: string; text: string; kind: string },
): Promise<void> {
  const row = page.getByRole('button', { name: clause, exact: true });
  if ((await row.getAttribute('aria-expanded')) !== 'true') await row.click();
  await page.getByRole('button', { name: `Write a note on ${clause}` }).click();
  await page.getByRole('textbox', { name: `Note on ${clause}` }).fill(text);
  await page.getByRole('radio', { name: kind }).check({ force: true });
  await page.getByRole('button', { name: 'Keep the note' }).click();
  await expect(page.getByText(text)).toBeVisible();
}

test('a mix design goes from upload to approval, with a return and a revision in between', async ({
  browser,
}) => {
  test.setTimeout(480_000);

  const manager = await asPerson(browser, 'Dele Fairweather');
  await expectAccessible(manager);
  await manager.goto('/submittals/new');
  await manager.getByRole('radio', { name: /CV-2031/ }).check({ force: true });
  await manager.getByRole('textbox', { name: 'Mix designation' }).fill(mix);
  await manager.locator('input[type=file]').setInputFiles(await workbook('BW-125-S6 r0.xlsx'));
  await expectAccessible(manager);
  await manager.getByRole('button', { name: 'Upload and read' }).click();
  await manager.waitForURL(/\/r\/0\/reading/, { timeout: 60_000 });
  await expect(manager.getByRole('heading', { name: /How the workbook was read/ })).toBeVisible();
  await expectAccessible(manager);
  await expectNoSidewaysScroll(manager);
  for (const meaning of ['3 April 2026', '4721.5 g', '2.4', '72.1 %']) {
    const kept = manager.waitForResponse((answer) => answer.url().endsWith('/answers'));
    await manager.getByRole('radio', { name: meaning, exact: true }).check({ force: true });
    await manager.getByRole('button', { name: 'Keep the answer' }).click();
    await kept;
  }
  await expect(manager.getByText('4 cells, 4 answered')).toBeVisible();

  await manager.getByRole('link', { name: 'Upload it again' }).click();
  await manager.locator('input[type=file]').setInputFiles(await workbook('BW-125-S4 r0.xlsx'));
  await expect(manager.getByRole('heading', { name: /BW-125-S4 r0.xlsx/ })).toBeVisible({ timeout: 60_000 });
  await expect(manager.getByText('Every cell that was used was read with certainty.')).toBeVisible();

  const findings = manager.url().replace(/\/reading.*/, '');
  await manager.goto(findings);
  await expect(manager.getByRole('heading', { name: new RegExp(mix) })).toBeVisible();
  await manager.getByRole('button', { name: '412.03(d)', exact: true }).click();
  await expect(manager.getByText('divides by total, not effective, binder').first()).toBeVisible();
  await expectAccessible(manager);
  await manager.goto(`${findings}/gradation`);
  await expect(manager.getByRole('figure').first()).toBeVisible();
  await expectAccessible(manager);

  await manager.goto(findings);
  await manager.getByText(/I declare this/).click();
  await manager.getByRole('button', { name: 'Submit revision 0' }).last().click();
  await expect(manager.getByText(/Received/).first()).toBeVisible();

  const reviewer = await asPerson(browser, 'Ines Tordoff');
  await expect(reviewer.getByText(mix).first()).toBeVisible();
  await expectAccessible(reviewer);
  await reviewer.goto(findings);
  await reviewer.getByRole('button', { name: 'Take for review' }).click();
  await expect(reviewer.getByRole('button', { name: 'Give back' })).toBeVisible();
  await writeNote(reviewer, { clause: '412.03(d)', text: returnedWord, kind: 'to be returned' });
  await writeNote(reviewer, { clause: '412.03(b)', text: internalWord, kind: 'internal' });
  await expectAccessible(reviewer);
  await reviewer.goto(`${findings}/return`);
  await expect(reviewer.getByRole('radio', { name: 'revise and resubmit' })).toBeChecked();
  await expect(reviewer.getByText(/page 1 of/)).toBeVisible({ timeout: 60_000 });
  await expectAccessible(reviewer);
  await reviewer.getByRole('button', { name: /Send to Mairi Halloran/ }).click();
  await expect(reviewer.getByText(/Ready to sign/).first()).toBeVisible();

  const engineer = await asPerson(browser, 'Mairi Halloran');
  await engineer.goto(findings);
  await engineer.getByRole('button', { name: '412.03(d)', exact: true }).click();
  await engineer.getByRole('button', { name: 'Waive with a reason' }).click();
  await engineer
    .getByRole('textbox', { name: 'Reason for waiving 412.03(d)' })
    .fill('Accepted for this lot after a look at the baghouse return.');
  await engineer
    .getByRole('button', { name: /^Waive/ })
    .last()
    .click();
  await expect(engineer.getByText('waived').first()).toBeVisible();
  await engineer.goto(`${findings}/return`);
  await engineer.getByRole('button', { name: /Sign and send/ }).click();
  await expect(engineer.getByText(/^Sent/).first()).toBeVisible({ timeout: 60_000 });

  await expect
    .poll(
      async () =>
        (await caughtSubjects(engineer)).some(
          (subject) => subject.includes(mix) && subject.includes('revise'),
        ),
      { timeout: 60_000 },
    )
    .toBe(true);
  const { text, files } = await caughtMail(
    engineer,
    (subject) => subject.includes(mix) && subject.includes('revise'),
  );
  expect(text).toContain(returnedWord);
  expect(files.map(({ name }) => name)).toEqual([
    `CV-2031 ${mix} r0 letter.pdf`,
    `CV-2031 ${mix} r0 findings.xlsx`,
  ]);
  const [letter = '', cells = ''] = await Promise.all([
    letterText(engineer, files[0]?.href),
    cellTexts(engineer, files[1]?.href),
  ]);
  for (const told of [text, letter, cells]) {
    expect(told.replace(/\s+/g, ' ')).toContain(returnedWord);
    expect(told.replace(/\s+/g, ' ')).not.toContain(internalWord);
  }

  await manager.goto(`${findings}/return`);
  await expect(manager.getByText(returnedWord).first()).toBeVisible();
  await expect(manager.getByText(internalWord)).toHaveCount(0);
  await expectAccessible(manager);
  await manager.getByRole('button', { name: 'Reply on 412.03(d)' }).click();
  await manager.getByRole('textbox', { name: 'Reply on 412.03(d)' }).fill(answerWord);
  await manager.getByRole('button', { name: 'Keep the reply' }).click();
  await expect(manager.getByText(answerWord)).toBeVisible();
  await manager.getByRole('link', { name: 'Upload revision 1' }).click();
  await manager.locator('input[type=file]').setInputFiles(await workbook('BW-125-S4 r1.xlsx'));
  await manager.getByRole('button', { name: /Upload and read/ }).click();
  await manager.waitForURL(/\/r\/1\/reading/, { timeout: 60_000 });
  const second = manager.url().replace(/\/reading.*/, '');
  await manager.goto(second);
  await manager.getByText(/I declare this/).click();
  await manager.getByRole('button', { name: 'Submit revision 1' }).last().click();
  await expect(manager.getByText(/Received/).first()).toBeVisible();

  await reviewer.goto(second);
  await expect(reviewer.getByText(answerWord).first()).toBeVisible();
  await reviewer.getByRole('button', { name: 'Take for review' }).click();
  await expect(reviewer.getByRole('button', { name: 'Give back' })).toBeVisible();
  await engineer.goto(`${second}/return`);
  await engineer.getByRole('radio', { name: 'approved as noted' }).check({ force: true });
  await engineer
    .getByRole('textbox', { name: 'Reason' })
    .fill('What was asked for is mended; the rest is advisory.');
  await engineer.getByRole('button', { name: /Sign and send/ }).click();
  await expect(engineer.getByText(/^Sent/).first()).toBeVisible({ timeout: 60_000 });
  await manager.goto(second);
  await expect(manager.getByText(/approved as noted/).first()).toBeVisible();
});

async function caughtSubjects(page: Page): Promise<string[]> {
  const { mails } = await (await page.request.get('/api/caught-mail')).json();
  return mails.map(({ subject }: { subject: string }) => subject);
}

interface CaughtMail {
  text: string;
  files: { name: string; href: string }[];
}

async function caughtMail(page: Page, wanted: (subject: string) => boolean): Promise<CaughtMail> {
  const { mails } = await (await page.request.get('/api/caught-mail')).json();
  const { id } = mails.find(({ subject }: { subject: string }) => wanted(subject));
  return (await page.request.get(`/api/caught-mail/${id}`)).json();
}

async function letterText(page: Page, href = ''): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'letter-'));
  try {
    const file = join(folder, 'letter.pdf');
    await writeFile(file, await (await page.request.get(href)).body());
    return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
  } finally {
    await rm(folder, { recursive: true });
  }
}

async function cellTexts(page: Page, href = ''): Promise<string> {
  const workbook = new exceljs.Workbook();
  await workbook.xlsx.load(new Uint8Array(await (await page.request.get(href)).body()).buffer);
  const texts: string[] = [];
  workbook.eachSheet((sheet) => sheet.eachRow((row) => row.eachCell((cell) => texts.push(cell.text))));
  return texts.join(' ');
}
