import exceljs from 'exceljs';
import { describe, expect, it } from 'vitest';
import { renderFindingsWorkbook } from '#server/documents/findings-workbook';
import { aDocumentInput } from '#tests/builders/a-document-input';
import { aFinding } from '#tests/builders/a-finding';

async function opened(bytes: Buffer): Promise<exceljs.Workbook> {
  const workbook = new exceljs.Workbook();
  await workbook.xlsx.load(new Uint8Array(bytes).buffer);
  return workbook;
}

describe('the findings workbook', () => {
  it('holds every finding as a row, with numbers as numbers', async () => {
    const findings = [
      aFinding({ outcome: 'fail', margin: -0.1 }),
      aFinding({ rule: 'cav', outcome: 'pass', clause: '412.02(a)' }),
    ];
    const sheet = (await opened(await renderFindingsWorkbook(aDocumentInput({ findings })))).getWorksheet(
      'Findings',
    );
    expect(sheet?.rowCount).toBe(3);
    expect(sheet?.getRow(2).getCell(5).value).toBe('fail');
    expect(sheet?.getRow(2).getCell(12).value).toBe(-0.1);
    expect(sheet?.getRow(3).getCell(1).value).toBe('412.02(a)');
  });

  it.each(['=HYPERLINK("http://x.example")', '+1+1', '-2+3', '@SUM(A1)', '\t=1'])(
    'keeps %s as text that no spreadsheet runs',
    async (text) => {
      const input = aDocumentInput({
        mixDesignation: text,
        findings: [aFinding({ outcome: 'fail', sentence: text })],
      });
      const workbook = await opened(await renderFindingsWorkbook(input));
      const cells: unknown[] = [];
      workbook.eachSheet((sheet) => sheet.eachRow((row) => row.eachCell((cell) => cells.push(cell.value))));
      for (const cell of cells) {
        expect(typeof cell === 'string' ? cell : '').not.toMatch(/^\s*[=+@]|^\s*-\d+\+/);
        expect(cell).not.toHaveProperty('formula');
      }
    },
  );
});
