import exceljs from 'exceljs';
import { evaluate } from '#rules/engine/evaluate';
import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { createWorkbookPool } from '#server/workbook/pool';
import { inTurn, told } from './measure';

const context = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };

/** Guard, decoding in a warm worker, reading and check, against exceljs opening the same bytes. */
export async function benchUploadToFindings(bytes: Buffer, edition: ResolvedEdition): Promise<string> {
  const pool = createWorkbookPool({ threads: 1 });
  const mapping = templateMapping(edition);
  try {
    const { first, second, ratio } = await inTurn(
      20,
      async () => {
        const decoded = await pool.decode({ bytes, fileName: 'bench.xlsx' });
        if (!decoded.ok) throw new Error(decoded.problem.detail);
        const { record } = readWorkbook({ grid: decoded.grid, mapping, edition, answers: [] });
        return evaluate(record, edition, context);
      },
      async () => new exceljs.Workbook().xlsx.load(new Uint8Array(bytes).buffer),
    );
    return `${(bytes.length / 1024).toFixed(0)} kB workbook, bytes to findings, warm, without database: ${told(first)}; exceljs alone: ${told(second)}; ratio ${ratio.toFixed(1)}, target at most 3`;
  } finally {
    await pool.close();
  }
}
