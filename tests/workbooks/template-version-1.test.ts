import { readFile } from 'node:fs/promises';
import { expect, it, vi } from 'vitest';
import { readWorkbook } from '#rules/reading/interpret';
import { headerRow } from '#rules/reading/template-layout';
import { templateMapping } from '#rules/reading/template-mapping';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import { decodeWorkbook } from '#server/workbook/decode';
import { demoEdition } from './demo/write-demo-workbooks';

vi.setConfig({ testTimeout: 60_000 });

const file = new URL('./files/template-version-1.xlsx', import.meta.url);

it('reads a template of version 1, which has no faces, dimensions and load on its creep sheet, without a doubt', async () => {
  const decoded = await decodeWorkbook(await readFile(file), 'BW-125-S4.xlsx');
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  const { grid } = decoded;
  expect(recogniseTemplate(grid)?.version).toBe(1);
  const creep = grid.sheets.find(({ name }) => name === 'Creep');
  const headers = creep?.cells.filter(({ row }) => row === headerRow).map(({ text }) => text);
  expect(headers).toEqual([
    'Temperature, °C',
    'Specimen',
    'Stress, kPa',
    'Loading time, s',
    'Creep strain, µε',
    'Creep compliance, 1/GPa',
    'Horizontal deformation, µm',
    'Vertical deformation, µm',
  ]);
  const edition = demoEdition();
  const reading = readWorkbook({ grid, mapping: templateMapping(edition), edition, answers: [] });
  expect([reading.doubts, reading.unread]).toEqual([[], []]);
  const { readings, documents } = reading.record;
  // Three specimens at each of three temperatures and one again, at eleven loading times.
  expect(readings.filter(({ quantity }) => quantity === 'creep-strain')).toHaveLength(110);
  // 800·(0.0402 + 0.8598·x/(1 + x)) with x = (1/260000)^0.5 = 0.0019612: 800·0.041883 = 33.51.
  expect(readings).toContainEqual(
    expect.objectContaining({
      quantity: 'creep-strain',
      value: 33.51,
      at: { temperature: -20, specimen: '1', stress: 800, time: 1 },
    }),
  );
  expect(readings).toContainEqual(
    expect.objectContaining({ quantity: 'mass-in-water', value: 2743.9, at: { trial: 'B', specimen: '1' } }),
  );
  expect(documents.map(({ type }) => type)).toContain('binder-certificate');
});
