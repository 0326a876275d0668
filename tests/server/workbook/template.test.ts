import ExcelJS from 'exceljs';
import { describe, expect, it } from 'vitest';
import { quantityById } from '#rules/quantities/registry';
import { readWorkbook } from '#rules/reading/interpret';
import { measuredQuantities } from '#rules/reading/measured-quantities';
import type { TemplateColumn } from '#rules/reading/template-columns';
import {
  headerRow,
  type TemplateSheet,
  type TemplateTable,
  templateLayout,
} from '#rules/reading/template-layout';
import { templateMapping } from '#rules/reading/template-mapping';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import type { Conditions } from '#rules/record';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import { decodeWorkbook } from '#server/workbook/decode';
import { buildTemplate, finishTemplate, headerText, writeTemplate } from '#server/workbook/write-template';
import { gridOf } from '#tests/workbooks/grid-of';

const editionHash = '0f3a';

/** Every shipped base edition, and each layer on the base that it stands on. */
const editions: [string, ResolvedEdition][] = (() => {
  const documents = shippedRuleSets.map(({ file, document }) => {
    const parsed = parseRuleSet(document);
    if (!parsed.ok) throw new Error(`${file}: ${parsed.problems[0]?.detail}`);
    return parsed.ruleSet;
  });
  return documents.map((document): [string, ResolvedEdition] => {
    const base = isLayer(document) ? baseOf(document, documents) : document;
    const resolution = resolveEdition(base, isLayer(document) ? [document] : []);
    if (!resolution.ok) throw new Error(resolution.problems[0]?.detail);
    return [`${document.id}, edition ${document.edition}`, resolution.edition];
  });
})();

function baseOf(layer: Layer, documents: (RuleSet | Layer)[]): RuleSet | Layer {
  const base = documents.find(
    ({ id, edition }) => id === layer.layerOf.id && edition === layer.layerOf.edition,
  );
  if (!base) throw new Error(`no base for ${layer.id}`);
  return base;
}

async function readBack(bytes: Buffer, edition: ResolvedEdition) {
  const decoded = await decodeWorkbook(bytes, 'template.xlsx');
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  const reading = readWorkbook({
    grid: decoded.grid,
    mapping: templateMapping(edition),
    edition,
    answers: [],
  });
  return { grid: decoded.grid, reading };
}

/** Something that may stand in the middle of the plausible range. */
function plausibleValue(id: string | null, edition: ResolvedEdition): number {
  const own = edition.quantities.find((quantity) => quantity.id === id);
  const quantity = own ?? (id === null ? undefined : quantityById(id));
  if (!quantity) return 1;
  const { min, max } = quantity.plausible;
  return Number((min + (max - min) * 0.4).toFixed(quantity.decimals));
}

function plausibleKey(column: TemplateColumn, row: number): string | number {
  const own: Record<string, string | number> = {
    trial: 'design',
    specimen: row + 1,
    stockpile: `Pile ${row + 1}`,
    gyrations: 'design',
    temperature: 25 + row,
    time: 10 * (row + 1),
    stress: 50,
    passes: 20_000,
    frequency: 10,
    sieve: 4.75,
    testedOn: '2026-02-03',
    date: '2026-02-03',
    validTo: '2027-02-03',
    quantity: ['Air voids', 'Sand equivalent'][row] ?? '',
    value: 7,
    unit: '%',
  };
  const [first] = column.list;
  if (column.names === 'type') return ['Binder certificate', 'Mix design report'][row] ?? '';
  if (first !== undefined && !first.startsWith('list:')) return first;
  return own[column.names ?? ''] ?? 'any';
}

function fillSheet(sheet: ExcelJS.Worksheet, part: TemplateSheet, edition: ResolvedEdition): void {
  if (part.kind === 'labels') {
    part.entries.forEach(({ quantity, list, unit }, at) => {
      const value = quantity.startsWith('attribute:')
        ? unit
          ? 12.5
          : 'any'
        : plausibleValue(quantity, edition);
      sheet.getCell(headerRow + 1 + at, 2).value = list[1] ?? value;
    });
  } else if (part.kind === 'gradation') {
    for (let column = 2; column <= 1 + part.stockpiles + part.columns.length; column += 1) {
      if (column <= part.stockpiles + 1) sheet.getCell(headerRow + 1, column).value = `Pile ${column}`;
      part.sievesMm.forEach((_, at) => {
        sheet.getCell(headerRow + 2 + at, column).value = 100 - 5 * at;
      });
    }
  } else fillTable(sheet, part, edition);
}

function fillTable(sheet: ExcelJS.Worksheet, part: TemplateTable, edition: ResolvedEdition): void {
  for (let row = 0; row < 2; row += 1) {
    part.columns.forEach((column, at) => {
      const cell = sheet.getCell(headerRow + (part.hasMethods ? 2 : 1) + row, at + 1);
      cell.value =
        column.role === 'value'
          ? plausibleValue(column.quantity, edition) + (column.quantity === null ? row + 11 : 0)
          : plausibleKey(column, row);
    });
  }
}

function hasPlace(quantity: string, at: Conditions, sheets: TemplateSheet[]): boolean {
  const { trial: _, ...asked } = at;
  const covers = (literal: Conditions, keys: (string | null)[]) =>
    Object.entries(asked).every(
      ([name, value]) => literal[name as keyof Conditions] === value || keys.includes(name),
    );
  return sheets.some((part) => {
    if (part.kind === 'labels')
      return part.entries.some((entry) => entry.quantity === quantity && covers(entry.at, []));
    const keys =
      part.kind === 'gradation' ? ['sieve', 'stockpile'] : part.columns.map((column) => column.names);
    return part.columns.some(
      (column) =>
        column.quantity === quantity &&
        covers(
          column.at,
          keys.filter((name) => !column.without.includes(name ?? '')),
        ),
    );
  });
}

describe.each(editions)('the template of %s', (_, edition) => {
  it('has the ten sheets, an instruction on each, units in headers, and no macros', async () => {
    const workbook = new ExcelJS.Workbook();
    const bytes = await writeTemplate(edition, { editionHash });
    await workbook.xlsx.load(bytes as unknown as ExcelJS.Buffer);
    const visible = workbook.worksheets.filter(({ state }) => state === 'visible');
    expect(visible.map(({ name }) => name)).toEqual([
      'Submittal',
      'Stockpiles',
      'Gradation',
      'Trials',
      'Aggregates',
      'Moisture',
      'Performance',
      'Creep',
      'Documents',
      'Readings',
    ]);
    for (const sheet of visible) expect(sheet.getCell('A2').text, sheet.name).toMatch(/\.$/);
    expect(bytes.includes('vbaProject')).toBe(false);
    expect(workbook.getWorksheet('Trials')?.getRow(headerRow).values).toContain('Dry mass in air, g');
  });

  it('has a named place for every quantity and condition that its rules look at', () => {
    const { sheets } = templateLayout(edition);
    const homeless = measuredQuantities(edition).filter(
      ({ quantity, at }) => !hasPlace(quantity, at, sheets),
    );
    expect(homeless).toEqual([]);
  });

  it('reads back empty with nothing read, nothing doubted and nothing left over', async () => {
    const { reading } = await readBack(await writeTemplate(edition, { editionHash }), edition);
    expect(reading.record).toEqual({ attributes: {}, readings: [], documents: [], doubts: [] });
    expect(reading.unread).toEqual([]);
  });

  it('reads back filled in every place without a doubt', async () => {
    const workbook = buildTemplate(edition, { editionHash });
    const { sheets } = templateLayout(edition);
    for (const part of sheets) {
      fillSheet(workbook.getWorksheet(part.name) as ExcelJS.Worksheet, part, edition);
    }
    const { reading } = await readBack(await finishTemplate(workbook, editionHash), edition);
    expect(reading.doubts).toEqual([]);
    expect(reading.unread).toEqual([]);
    for (const { quantity } of measuredQuantities(edition)) {
      expect(reading.record.readings.map((each) => each.quantity)).toContain(quantity);
    }
    expect(reading.record.documents).toMatchObject([
      { type: 'binder-certificate', date: '2026-02-03', validTo: '2027-02-03' },
      {},
    ]);
  });

  it('is recognised by its stamp, with its version and its edition', async () => {
    const { grid } = await readBack(await writeTemplate(edition, { editionHash }), edition);
    expect(recogniseTemplate(grid)).toEqual({ version: 2, editionHash });
    expect(recogniseTemplate({ ...grid, properties: {} })).toEqual({ version: 2, editionHash });
  });

  it('has no two headers on one sheet that could be taken for each other', () => {
    for (const part of templateLayout(edition).sheets) {
      const headers =
        part.kind === 'labels' ? part.entries.map(({ label }) => label) : part.columns.map(headerText);
      expect(new Set(headers).size, part.name).toBe(headers.length);
    }
  });
});

describe('the template of the airfield section', () => {
  it('offers the words that its rules name for a form of a test', () => {
    const [, edition] = editions.find(([name]) => name.startsWith('cvra-421')) ?? [];
    if (!edition) throw new Error('no airfield edition');
    const sheet = templateLayout(edition).sheets.find(({ name }) => name === 'Performance');
    if (sheet?.kind !== 'table') throw new Error('no table');
    expect(sheet.columns.find(({ names }) => names === 'variant')?.list).toEqual(['maximum']);
    expect(sheet.columns.find(({ quantity }) => quantity === 'joint-density')?.unit).toBe('%');
  });
});

describe('the drop-downs of the template', () => {
  it('offer closed values of attributes, the methods of a quantity, sieves, and every method for a free reading', async () => {
    const [, edition] = editions.find(([name]) => name === 'cvra-412, edition 2026') ?? [];
    if (!edition) throw new Error('no edition');
    const workbook = buildTemplate(edition, { editionHash });
    const sheetOf = (name: string) => {
      const sheet = workbook.getWorksheet(name);
      if (!sheet) throw new Error(`no sheet ${name}`);
      return sheet;
    };
    const listAt = (name: string, row: number, column: number) =>
      String(sheetOf(name).getCell(row, column).dataValidation?.formulae[0]);
    const listUnder = (name: string, header: string, below: number): string => {
      const texts = sheetOf(name).getRow(headerRow).values as (string | undefined)[];
      const at = texts.findIndex((text) => (text ?? '').startsWith(header));
      return listAt(name, headerRow + below, at);
    };
    const courses = listAt('Submittal', sheetOf('Submittal').getColumn(1).values.indexOf('Course'), 2);
    expect(courses).toMatch(/^".*surface.*base.*"$/i);
    expect(listUnder('Trials', 'Bulk specific gravity', 1)).toContain('AASHTO T 166');
    expect(listUnder('Gradation', 'Sieve', 2)).toMatch(/^"50,37\.5,25,.*,0\.075"$/);
    expect(listUnder('Readings', 'Sieve', 1)).toMatch(/^"50,37\.5,25,.*,0\.075"$/);
    expect(listUnder('Readings', 'Method', 1)).toMatch(/^Lists!\$C\$2:\$C\$\d+$/);
    const methods = workbook.getWorksheet('Lists')?.getColumn(3).values;
    expect(methods).toEqual(expect.arrayContaining(['Methods', 'AASHTO T 166', 'AASHTO T 176']));
  });
});

describe('the stamp', () => {
  it('is not seen in another layout', () => {
    expect(
      recogniseTemplate(gridOf({ Trials: { cells: { A1: 'Gyratory trial blends', A2: 4 } } })),
    ).toBeNull();
  });
});

describe('a template for a project', () => {
  it('carries the attributes that the project states', async () => {
    const [, edition] = editions[1] ?? [];
    if (!edition) throw new Error('no edition');
    const bytes = await writeTemplate(edition, {
      editionHash,
      projectFacts: { designTraffic: 12, course: 'surface' },
    });
    const { reading } = await readBack(bytes, edition);
    expect(reading.record.attributes).toMatchObject({
      designTraffic: { value: 12 },
      course: { value: 'surface' },
    });
  });
});
