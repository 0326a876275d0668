import { describe, expect, it } from 'vitest';
import { guardWorkbook } from '#server/workbook/guard';
import { workbookLimits } from '#server/workbook/limits';
import { rawXlsx, sheetData, withDeclaredSize } from '#tests/workbooks/raw-xlsx';

const plain = () => rawXlsx({ sheets: [{ name: 'A', xml: sheetData([['x', 1]]) }] });
const ole = Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(512)]);
const locked = Buffer.concat([ole, Buffer.from('EncryptedPackage', 'utf16le'), Buffer.alloc(512)]);

async function refusalOf(bytes: Buffer, name: string, limits = workbookLimits) {
  const result = await guardWorkbook(bytes, name, limits);
  if (result.ok) throw new Error(`${name} was admitted`);
  return result.problem;
}

describe('guarding an upload', () => {
  it('admits a plain workbook and a text table', async () => {
    expect(await guardWorkbook(await plain(), 'mix.xlsx')).toEqual({ ok: true, kind: 'xlsx' });
    expect(await guardWorkbook(Buffer.from('a,b\n1,2\n'), 'mix.csv')).toEqual({ ok: true, kind: 'csv' });
  });

  it.each([
    ['an old workbook under its own name', ole, 'mix.xls', /old \.xls format/],
    ['an old workbook renamed', ole, 'mix.xlsx', /old \.xls format, whatever its name/],
    ['a workbook locked with a password', locked, 'mix.xlsx', /locked with a password/],
    [
      'a web page under the name of a workbook',
      Buffer.from('<html><table></table></html>'),
      'mix.xlsx',
      /is a web page/,
    ],
    ['text under the name of a workbook', Buffer.from('a;b\n1;2\n'), 'mix.xlsx', /is plain text/],
    ['a PDF under the name of a workbook', Buffer.from('%PDF-1.7 '), 'mix.xlsx', /is a PDF/],
    [
      'a web page under the name of a text table',
      Buffer.from('<!DOCTYPE html><p>'),
      'mix.csv',
      /is a web page/,
    ],
    ['a workbook whose name allows macros', ole, 'mix.xlsm', /may carry macros/],
    ['another kind of file', Buffer.from('x'), 'mix.docx', /ends in none of/],
    ['an empty file', Buffer.alloc(0), 'mix.xlsx', /is empty/],
  ])('refuses %s', async (_, bytes, name, detail) => {
    const problem = await refusalOf(bytes, name);
    expect(problem.slug).toBe('file-refused');
    expect(problem.detail).toMatch(detail);
    expect(problem.detail).not.toContain('\n');
    expect(problem.fix).toMatch(/^[A-Z].*\.$/);
  });

  it('refuses macros inside a file that ends in .xlsx, by their part and by the declared content type', async () => {
    const sheets = [{ name: 'A', xml: sheetData([[1]]) }];
    const withPart = await rawXlsx({ sheets, extraParts: { 'xl/vbaProject.bin': 'x' } });
    expect((await refusalOf(withPart, 'mix.xlsx')).detail).toMatch(/carries macros/);
    const types =
      '<Types><Override ContentType="application/vnd.ms-excel.sheet.macroEnabled.main+xml"/></Types>';
    const declared = await rawXlsx({ sheets, extraParts: { '[Content_Types].xml': types } });
    expect((await refusalOf(declared, 'mix.xlsx')).detail).toMatch(/with macros under another name/);
  });

  it('refuses a zip that is no workbook', async () => {
    const bytes = await rawXlsx({ sheets: [] });
    expect((await refusalOf(bytes, 'mix.xlsx')).detail).toMatch(/without a worksheet/);
  });

  it('refuses a file that was cut short', async () => {
    const bytes = await plain();
    const problem = await refusalOf(bytes.subarray(0, bytes.length - 40), 'mix.xlsx');
    expect(problem.detail).toMatch(/damaged or was cut short/);
  });

  it('refuses a file with a damaged part', async () => {
    const bytes = Buffer.from(await plain());
    bytes.fill(0xff, 60, 90);
    expect((await refusalOf(bytes, 'mix.xlsx')).detail).toMatch(/damaged in its part/);
  });

  it('takes a file of exactly the size cap and refuses one byte more', async () => {
    const bytes = await plain();
    const at = { ...workbookLimits, fileBytes: bytes.length };
    expect(await guardWorkbook(bytes, 'mix.xlsx', at)).toEqual({ ok: true, kind: 'xlsx' });
    expect((await refusalOf(bytes, 'mix.xlsx', { ...at, fileBytes: bytes.length - 1 })).slug).toBe(
      'too-large',
    );
  });

  it('refuses a bomb that declares its size, before inflating it', async () => {
    const bytes = await rawXlsx({ sheets: [{ name: 'A', xml: ' '.repeat(3_000_000) }] });
    const problem = await refusalOf(bytes, 'mix.xlsx', { ...workbookLimits, inflatedBytes: 1024 * 1024 });
    expect(problem.slug).toBe('too-large');
    expect(problem.detail).toMatch(/unpacks to more than the 1 MB/);
  });

  it('refuses a bomb that lies about its size', async () => {
    const bomb = await rawXlsx({ sheets: [{ name: 'A', xml: ' '.repeat(3_000_000) }] });
    const lying = withDeclaredSize(bomb, 'xl/worksheets/sheet1.xml', 1000);
    const problem = await refusalOf(lying, 'mix.xlsx', { ...workbookLimits, inflatedBytes: 1024 * 1024 });
    expect(problem.detail).toMatch(/damaged in its part xl\/worksheets\/sheet1\.xml/);
  });

  it('refuses too many parts and too many sheets', async () => {
    const sheets = Array.from({ length: 3 }, (_, at) => ({ name: `S${at}`, xml: sheetData([[1]]) }));
    const bytes = await rawXlsx({ sheets });
    expect((await refusalOf(bytes, 'mix.xlsx', { ...workbookLimits, sheets: 2 })).detail).toMatch(
      /3 sheets; at most 2/,
    );
    expect((await refusalOf(bytes, 'mix.xlsx', { ...workbookLimits, zipEntries: 4 })).detail).toMatch(
      /parts, more than/,
    );
  });
});
