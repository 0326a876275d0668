import { expect, type Page, test } from '@playwright/test';
import exceljs from 'exceljs';
import { asPerson, expectAccessible, expectNoSidewaysScroll } from './support';

const sheet = 'Verdichtung';

/** A laboratory's own layout: what it calls the third column no reader can know. */
async function laboratoryWorkbook(
  name: string,
  first: number,
): Promise<{
  name: string;
  mimeType: string;
  buffer: Buffer;
}> {
  const workbook = new exceljs.Workbook();
  const page = workbook.addWorksheet(sheet);
  page.addRow(['Brightwater Central, gyratory book']);
  page.addRow([]);
  page.addRow(['Trial', 'Specimen', 'Book value', 'Gmm']);
  for (let row = 0; row < 6; row += 1) {
    const trial = row < 3 ? 'A' : 'B';
    page.addRow([trial, (row % 3) + 1, first + row / 1000, 2.486]);
  }
  return {
    name,
    mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    buffer: Buffer.from(await workbook.xlsx.writeBuffer()),
  };
}

async function upload(page: Page, mix: string, file: Awaited<ReturnType<typeof laboratoryWorkbook>>) {
  await page.goto('/submittals/new');
  await page.locator('input[type=file]').setInputFiles(file);
  await page.getByRole('radio', { name: /CV-2031/ }).check({ force: true });
  await page.getByRole('textbox', { name: 'Mix designation' }).fill(mix);
  await page.getByRole('button', { name: 'Upload and read' }).click();
  await page.waitForURL(/\/r\/0\/reading/, { timeout: 60_000 });
  await expect(page.getByRole('grid')).toBeVisible();
}

test('a block is said to be a quantity once, undone, said again, and the next workbook needs no answer', async ({
  browser,
}) => {
  test.setTimeout(480_000);
  const page = await asPerson(browser, 'Dele Fairweather');
  await upload(page, 'BW-125-T1', await laboratoryWorkbook('BW-125-T1.xlsx', 2.367));

  await page.keyboard.press('g');
  await page.keyboard.type('C4');
  await page.keyboard.press('Enter');
  await page.getByRole('grid').focus();
  for (let row = 5; row <= 9; row += 1) await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'What are C4:C9?' })).toBeVisible();
  await page.getByRole('radio', { name: 'readings of a quantity' }).check({ force: true });
  await page.getByRole('combobox', { name: 'Quantity' }).fill('Gmb');
  await page.getByRole('option', { name: /bulk specific gravity of the compacted mix/ }).click();
  // Once the rows are specimens, a Gmm that each repeats is their trial's.
  await expect(page.getByText('Eight readings come, six readings go.')).toBeVisible();
  await expectAccessible(page);
  await expectNoSidewaysScroll(page);
  await page.getByRole('button', { name: 'Keep it' }).click();

  const said = page.getByRole('region', { name: 'Said by people' });
  await expect(said.getByText(/is bulk specific gravity of the compacted mix/)).toBeVisible();
  await said.getByRole('button', { name: 'Undo what C4:C9 is' }).click();
  await expect(said.getByRole('button', { name: 'Do what C4:C9 is again' })).toBeVisible();
  await expect(said.getByText(/is bulk specific gravity/)).toHaveCount(0);
  await said.getByRole('button', { name: 'Do what C4:C9 is again' }).click();
  await expect(said.getByText(/is bulk specific gravity of the compacted mix/)).toBeVisible();

  await page.getByRole('button', { name: 'Type a reading' }).click();
  await page.getByRole('combobox', { name: 'Quantity' }).last().fill('Gsb');
  await page
    .getByRole('option', { name: /aggregate/ })
    .first()
    .click();
  await page.getByRole('textbox', { name: 'Value' }).fill('2.637');
  await page.getByRole('button', { name: 'Keep it as typed' }).click();
  await expect(page.getByText(/typed by Dele Fairweather/)).toBeVisible();

  await upload(page, 'BW-125-T2', await laboratoryWorkbook('BW-125-T2.xlsx', 2.371));
  const notice = page.getByRole('region', { name: 'The mapping that it was read with' });
  await expect(notice.getByText(/The workbook has the layout that it was learned from/)).toBeVisible();
  await expect(page.getByRole('region', { name: 'In doubt' }).getByText('none')).toBeVisible();
  await page.keyboard.press('g');
  await page.keyboard.type('C9');
  await page.keyboard.press('Enter');
  await expect(page.getByText(/Gmb, trial B, specimen 3/)).toBeVisible();

  await notice.getByRole('link').first().click();
  await expect(page.getByRole('heading', { name: 'What it says' })).toBeVisible();
  await expectAccessible(page);
});
