import exceljs from 'exceljs';
import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import { creepWords } from '#server/documents/creep-words';
import { renderFindingsWorkbook } from '#server/documents/findings-workbook';
import { aCreepTest } from '#tests/builders/a-creep-test';
import { aDocumentInput } from '#tests/builders/a-document-input';
import { aFinding } from '#tests/builders/a-finding';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition } from '#tests/builders/a-rule-set';

async function opened(bytes: Buffer): Promise<exceljs.Workbook> {
  const workbook = new exceljs.Workbook();
  await workbook.xlsx.load(new Uint8Array(bytes).buffer);
  return workbook;
}

const room = {
  answer: 'A binder content of 5.10 to 5.51 % meets the one rule that can be followed.',
  lines: [{ clause: '412.03(b)', title: 'VMA', limit: 'at least 14.0 %', holds: '5.10 to 5.51 %' }],
  notes: ['Read between four trials.'],
};

function columnHeadings(sheet: exceljs.Worksheet | undefined): string[] {
  const values = sheet?.getRow(1).values;
  return Array.isArray(values) ? values.slice(1).map(String) : [];
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

  it('says why each limit, what would pass and what would decide, and gives the room to move a sheet', async () => {
    const findings = [
      aFinding({ outcome: 'fail' }),
      aFinding({ rule: 'cav', outcome: 'undecided', wouldDecide: 'Answer the doubt at Trials E9.' }),
    ];
    const way = { quantity: 'binder-content', name: 'Pb', unit: '%', present: 5.3, from: 5.4, to: null };
    const explanations = {
      'vma~design point': {
        whyThisLimit: 'Nominal maximum aggregate size 12.5 mm: Table 412-2 gives the limit.',
        toPass: [{ ...way, words: 'Pb of 5.40 % or more instead of 5.30' }],
      },
    };
    const workbook = await opened(
      await renderFindingsWorkbook(aDocumentInput({ findings, explanations, room })),
    );
    const rows = workbook.getWorksheet('Findings');
    const headings = columnHeadings(rows);
    const cell = (row: number, heading: string) =>
      rows?.getRow(row).getCell(headings.indexOf(heading) + 1).value;
    expect(cell(2, 'Why this limit')).toMatch(/^Nominal maximum aggregate size 12\.5 mm/);
    expect(cell(2, 'To pass')).toBe('Pb of 5.40 % or more instead of 5.30.');
    expect(cell(3, 'What would decide it')).toBe('Answer the doubt at Trials E9.');
    const sheet = workbook.getWorksheet('Room to move');
    expect(sheet?.getRow(1).getCell(1).value).toBe(room.answer);
    expect(sheet?.getRow(4).values).toEqual([
      undefined,
      '412.03(b)',
      'VMA',
      'at least 14.0 %',
      '5.10 to 5.51 %',
    ]);
  });

  it('gives the creep tests a sheet with the figures of the screen and every point as numbers', async () => {
    const { analysis } = evaluate(
      aRecord({ readings: [...aCreepTest({ specimens: [0.98, 1] }), ...aCreepTest({ temperature: 0 })] }),
      anEdition(),
      aContext(),
    );
    const creep = creepWords(analysis.creep);
    const workbook = await opened(await renderFindingsWorkbook(aDocumentInput({ creep })));
    const sheet = workbook.getWorksheet('Creep compliance');
    const rows = sheet?.getRows(1, sheet.rowCount) ?? [];
    const first = rows.map((row) => String(row.getCell(1).value ?? ''));
    expect(first).toContain('Creep compliance at −10 °C under 200 kPa');
    expect(first.find((text) => text.startsWith('Sigmoid: D0 '))).toMatch(
      / 1\/GPa \(.* to .*\); .*; R² \d\.\d{3}, 14 points$/,
    );
    expect(first.find((text) => text.startsWith('log aT at −10 °C'))).toBe('log aT at −10 °C: reference');
    const heads = first.indexOf('Temperature, °C');
    expect(rows.slice(heads + 1).map((row) => row.getCell(5).value)).toHaveLength(21);
    // 0.98 times CRP-15's 0.05135117 at 1 s, as strain to six digits under 200 kPa.
    expect(rows[heads + 1]?.values).toEqual([undefined, -10, 200, '1', 1, 0.050324, 'Creep E2']);
  });

  it('has no such sheet without creep tests', async () => {
    expect(creepWords([])).toBeNull();
    const workbook = await opened(await renderFindingsWorkbook(aDocumentInput({})));
    expect(workbook.getWorksheet('Creep compliance')).toBeUndefined();
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
