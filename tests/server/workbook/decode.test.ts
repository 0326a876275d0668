import ExcelJS from 'exceljs';
import { describe, expect, it } from 'vitest';
import { decodeWorkbook } from '#server/workbook/decode';
import { workbookLimits } from '#server/workbook/limits';
import { rawXlsx, sheetData } from '#tests/workbooks/raw-xlsx';

async function gridOf(bytes: Buffer, name = 'mix.xlsx') {
  const result = await decodeWorkbook(bytes, name);
  if (!result.ok) throw new Error(result.problem.detail);
  return result.grid;
}

async function cellsOf(bytes: Buffer, name?: string) {
  const grid = await gridOf(bytes, name);
  return new Map(grid.sheets.flatMap((sheet) => sheet.cells.map((cell) => [cell.address, cell] as const)));
}

async function workbookOf(
  fill: (sheet: ExcelJS.Worksheet, workbook: ExcelJS.Workbook) => void,
): Promise<Buffer> {
  const workbook = new ExcelJS.Workbook();
  fill(workbook.addWorksheet('Data'), workbook);
  return Buffer.from(await workbook.xlsx.writeBuffer());
}

describe('decoding a workbook', () => {
  it('keeps numbers in their stored form and shows them through their format', async () => {
    const cells = await cellsOf(
      await workbookOf((sheet) => {
        sheet.getCell('A1').value = 2.4118;
        sheet.getCell('A1').numFmt = '0.000';
        sheet.getCell('A2').value = 0.042;
        sheet.getCell('A2').numFmt = '0.0%';
        sheet.getCell('A3').value = 0.1 + 0.2;
      }),
    );
    expect(cells.get('A1')).toMatchObject({
      kind: 'number',
      value: '2.4118',
      text: '2.412',
      format: '0.000',
    });
    expect(cells.get('A2')).toMatchObject({ value: '0.042', text: '4.2%' });
    expect(cells.get('A3')).toMatchObject({ value: '0.30000000000000004', text: '0.3' });
  });

  it('tells formulas with a cached result from formulas without one, and keeps errors as errors', async () => {
    const cells = await cellsOf(
      await workbookOf((sheet) => {
        sheet.getCell('A1').value = { formula: 'B1/C1', result: 2.5 };
        sheet.getCell('A2').value = { formula: 'B2/C2', date1904: false };
        sheet.getCell('A3').value = { formula: 'B3/C3', result: { error: '#DIV/0!' } };
        sheet.getCell('A4').value = { error: '#REF!' };
      }),
    );
    expect(cells.get('A1')).toMatchObject({ kind: 'number', value: '2.5', formula: 'B1/C1', cached: true });
    expect(cells.get('A2')).toMatchObject({ kind: 'formula-without-result', value: '', cached: false });
    expect(cells.get('A3')).toMatchObject({ kind: 'error', value: '#DIV/0!' });
    expect(cells.get('A4')).toMatchObject({ kind: 'error', value: '#REF!' });
  });

  it('gives a shared formula to each of its cells, moved with the cell', async () => {
    const xml =
      '<sheetData><row r="1"><c r="B1"><f t="shared" ref="B1:B2" si="0">A1*$C$1+SUM(A1:A9)</f><v>1</v></c></row>' +
      '<row r="2"><c r="B2"><f t="shared" si="0"/><v>2</v></c></row></sheetData>';
    const cells = await cellsOf(await rawXlsx({ sheets: [{ name: 'A', xml }] }));
    expect(cells.get('B2')?.formula).toBe('A2*$C$1+SUM(A2:A10)');
  });

  it('reads dates as calendar dates in both epochs', async () => {
    const day = new Date(Date.UTC(2026, 2, 4));
    const fill = (sheet: ExcelJS.Worksheet) => {
      sheet.getCell('A1').value = day;
      sheet.getCell('A1').numFmt = 'd mmm yyyy';
    };
    const cells = await cellsOf(await workbookOf(fill));
    expect(cells.get('A1')).toMatchObject({ kind: 'date', value: '2026-03-04', text: '4 Mar 2026' });
    const from1904 = await workbookOf((sheet, workbook) => {
      workbook.properties.date1904 = true;
      fill(sheet);
    });
    const grid = await gridOf(from1904);
    expect(grid.date1904).toBe(true);
    expect(grid.sheets[0]?.cells[0]?.value).toBe('2026-03-04');
  });

  it('joins rich text, follows shared and inline strings and leaves reading aids out', async () => {
    const bytes = await rawXlsx({
      sheets: [
        {
          name: 'A',
          xml: '<sheetData><row r="1"><c r="A1" t="s"><v>0</v></c><c r="B1" t="inlineStr"><is><r><t>Air </t></r><r><t>voids</t></r></is></c></row></sheetData>',
        },
      ],
      sharedStrings: '<si><r><t>Binder </t></r><r><t>content</t></r><rPh sb="0" eb="1"><t>aid</t></rPh></si>',
    });
    const cells = await cellsOf(bytes);
    expect(cells.get('A1')?.text).toBe('Binder content');
    expect(cells.get('B1')?.text).toBe('Air voids');
  });

  it('keeps hyperlinks as their text, merges once, and says what is hidden', async () => {
    const grid = await gridOf(
      await workbookOf((sheet, workbook) => {
        sheet.getCell('A1').value = { text: 'Report', hyperlink: 'https://lab.example/1' };
        sheet.mergeCells('A2:C2');
        sheet.getCell('A2').value = 'Masses';
        sheet.getCell('A4').value = 1;
        sheet.getRow(4).hidden = true;
        sheet.getCell('E5').value = 2;
        sheet.getColumn(5).hidden = true;
        workbook.addWorksheet('Calc', { state: 'veryHidden' }).getCell('A1').value = 3;
      }),
    );
    const [data, calc] = grid.sheets;
    expect(data?.cells.find((cell) => cell.address === 'A1')?.text).toBe('Report');
    expect(data?.merges).toEqual(['A2:C2']);
    expect(data?.cells.filter((cell) => cell.row === 2)).toHaveLength(1);
    expect(data?.hiddenRows).toEqual([4]);
    expect(data?.hiddenColumns).toEqual([5]);
    expect(calc?.hidden).toBe(true);
  });

  it('keeps the comment of a cell', async () => {
    const bytes = await rawXlsx({
      sheets: [{ name: 'A', xml: sheetData([[1]]), comments: { A1: 'edge chip' } }],
    });
    expect((await cellsOf(bytes)).get('A1')?.comment).toBe('edge chip');
  });

  it('reads rows and cells that carry no address', async () => {
    const xml = '<sheetData><row><c><v>1</v></c><c><v>2</v></c></row><row><c><v>3</v></c></row></sheetData>';
    const cells = await cellsOf(await rawXlsx({ sheets: [{ name: 'A', xml }] }));
    expect([...cells.keys()]).toEqual(['A1', 'B1', 'A2']);
  });

  it('reads a file in the strict variant of the format', async () => {
    const bytes = await rawXlsx({ strict: true, sheets: [{ name: 'A', xml: sheetData([['Gmm', 2.486]]) }] });
    expect((await cellsOf(bytes)).get('B1')?.value).toBe('2.486');
  });

  it('reads what scripting libraries write: a formula with an empty result element', async () => {
    const xml =
      '<sheetData><row r="1"><c r="A1"><f>B1*2</f><v></v></c><c r="C1" t="str"><f>IF(B1,"x","")</f><v></v></c></row></sheetData>';
    const cells = await cellsOf(await rawXlsx({ sheets: [{ name: 'A', xml }] }));
    expect(cells.get('A1')?.kind).toBe('formula-without-result');
    expect(cells.has('C1')).toBe(false);
  });

  it('reads a hundred sheets, and sheets with names in other scripts', async () => {
    const sheets = Array.from({ length: 100 }, (_, at) => ({ name: `ورقة ${at}`, xml: sheetData([[at]]) }));
    const grid = await gridOf(await rawXlsx({ sheets }));
    expect(grid.sheets).toHaveLength(100);
    expect(grid.sheets[99]).toMatchObject({ name: 'ورقة 99' });
  });

  it('passes over a million formatted empty rows', async () => {
    const empty = Array.from({ length: 1_000_000 }, (_, at) => `<row r="${at + 2}" s="1"/>`);
    const xml = `<sheetData><row r="1"><c r="A1"><v>7</v></c></row>${empty.join('')}</sheetData>`;
    const grid = await gridOf(await rawXlsx({ sheets: [{ name: 'A', xml }] }));
    expect(grid.sheets[0]?.cells).toHaveLength(1);
    expect(grid.sheets[0]?.rowCount).toBe(1);
  }, 30_000);

  it('refuses one filled cell more than the cap', async () => {
    const bytes = await rawXlsx({ sheets: [{ name: 'A', xml: sheetData([[1, 2, 3]]) }] });
    const at = await decodeWorkbook(bytes, 'mix.xlsx', { limits: { ...workbookLimits, cells: 3 } });
    expect(at.ok).toBe(true);
    const over = await decodeWorkbook(bytes, 'mix.xlsx', { limits: { ...workbookLimits, cells: 2 } });
    expect(over).toMatchObject({ ok: false, problem: { slug: 'too-large' } });
  });

  it('refuses a sheet that is not well-formed, and names its part', async () => {
    const bytes = await rawXlsx({ sheets: [{ name: 'A', xml: '<sheetData><row></sheetData>' }] });
    const result = await decodeWorkbook(bytes, 'mix.xlsx');
    expect(result).toMatchObject({ ok: false });
    if (!result.ok) expect(result.problem.detail).toMatch(/damaged in its part xl\/worksheets\/sheet1\.xml/);
  });

  it('counts sheets as they are done', async () => {
    const seen: [number, number][] = [];
    const sheets = ['A', 'B'].map((name) => ({ name, xml: sheetData([[1]]) }));
    await decodeWorkbook(await rawXlsx({ sheets }), 'mix.xlsx', {
      onProgress: (done, total) => seen.push([done, total]),
    });
    expect(seen).toEqual([
      [0, 2],
      [1, 2],
      [2, 2],
    ]);
  });
});

describe('decoding a text table', () => {
  it.each([
    ['comma', 'Trial,Gmb\nA,2.410\n'],
    ['semicolon', 'Trial;Gmb\nA;2.410\n'],
    ['tab', 'Trial\tGmb\nA\t2.410\n'],
  ])('finds the %s as separator and keeps the digits shown', async (_, text) => {
    const grid = await gridOf(Buffer.from(text), 'mix.csv');
    expect(grid.sheets[0]?.name).toBe('');
    const cells = await cellsOf(Buffer.from(text), 'mix.csv');
    expect(cells.get('B2')).toMatchObject({ kind: 'number', value: '2.41', text: '2.410' });
  });

  it('reads UTF-8 with a mark, UTF-16 and Windows-1252', async () => {
    const utf16 = Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from('°C;1', 'utf16le')]);
    for (const bytes of [Buffer.from('\ufeff°C;1'), utf16, Buffer.from([0xb0, 0x43, 0x3b, 0x31])]) {
      expect((await cellsOf(bytes, 'mix.csv')).get('A1')?.text).toBe('°C');
    }
  });

  it('leaves a point beside decimal commas to the reading, and takes no note of the separator for a row', async () => {
    const cells = await cellsOf(Buffer.from('sep=;\nPasses;Va\n20.000;4,2\n'), 'mix.csv');
    expect([cells.get('A1')?.text, cells.get('A2')?.kind, cells.get('B2')?.value]).toEqual([
      'Passes',
      'text',
      '4,2',
    ]);
    const plain = await cellsOf(Buffer.from('Passes;Va\n20.5;4.2\n'), 'mix.csv');
    expect([plain.get('A2')?.kind, plain.get('B2')?.value]).toEqual(['number', '4.2']);
  });

  it('reads a table parted by tabs under the name .tsv', async () => {
    const cells = await cellsOf(Buffer.from('Trial\tGmm\nA\t2.512\n'), 'mix.tsv');
    expect(cells.get('B2')).toMatchObject({ kind: 'number', value: '2.512' });
  });

  it('keeps separators and line ends inside quotes', async () => {
    const cells = await cellsOf(Buffer.from('"a, ""b""\nc",2\n'), 'mix.csv');
    expect(cells.get('A1')?.text).toBe('a, "b"\nc');
    expect(cells.get('B1')?.value).toBe('2');
  });

  it('refuses a quotation mark that is never closed, with its row', async () => {
    const result = await decodeWorkbook(Buffer.from('a,b\n"c,d\n'), 'mix.csv');
    expect(result).toMatchObject({ ok: false, problem: { detail: expect.stringMatching(/row 2/) } });
  });
});
