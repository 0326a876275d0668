import type exceljs from 'exceljs';
import type { Explanation } from '#rules/engine/explanation';
import type { Finding } from '#rules/engine/finding';
import { findingKey } from '#rules/engine/finding';
import { toPassWords } from '#rules/engine/to-pass';
import { cautionsFor } from '#shared/cautions';
import { formatDate } from '#shared/format/dates';
import { mayLeaveOut, nextActHeadings, nextActOf } from '#shared/next-acts';
import { neutralise } from '../workbook/neutralise';
import { addCreepSheet } from './creep-sheet';
import type { DocumentInput } from './document-input';

const columns = [
  { header: 'Clause', width: 12 },
  { header: 'Requirement', width: 52 },
  { header: 'Subject', width: 16 },
  { header: 'Severity', width: 10 },
  { header: 'Outcome', width: 15 },
  { header: 'Borderline', width: 10 },
  { header: 'Observed', width: 12 },
  { header: 'Unrounded', width: 12 },
  { header: 'Unit', width: 9 },
  { header: 'At least', width: 10 },
  { header: 'At most', width: 10 },
  { header: 'Margin', width: 10 },
  { header: 'Next', width: 20 },
  { header: 'Result', width: 52 },
  { header: 'Reason', width: 52 },
  { header: 'Why this limit', width: 52 },
  { header: 'To pass', width: 52 },
  { header: 'What would decide it', width: 40 },
  { header: 'Waived because', width: 30 },
  { header: 'Notes to be returned', width: 52 },
  { header: 'Cell', width: 18 },
];

/** Every finding as a row, with numbers as numbers. Text that a spreadsheet could run is neutralised. */
export async function renderFindingsWorkbook(input: DocumentInput): Promise<Buffer> {
  // Large, and needed by few requests: loaded by the first of them.
  const { default: library } = await import('exceljs');
  const workbook = new library.Workbook();
  workbook.creator = neutralise(input.agency.name);
  addSummary(workbook, input);
  addFindings(workbook, input);
  addRoom(workbook, input);
  addCreepSheet(workbook, input.creep);
  return Buffer.from(await workbook.xlsx.writeBuffer());
}

function addSummary(workbook: exceljs.Workbook, input: DocumentInput): void {
  const sheet = workbook.addWorksheet('Summary');
  sheet.columns = [{ width: 26 }, { width: 90 }];
  const rows: [string, string | number][] = [
    ['Agency', input.agency.name],
    ['Project', `${input.project.number} ${input.project.title}`],
    ['Contractor', input.contractor],
    ['Mix', `${input.mixDesignation} revision ${input.revision}`],
    ['Description', input.mixDescription],
    ['Judged against', input.section],
    ['Checked on', formatDate(input.checkedOn)],
    ['Disposition', input.disposition ?? `not decided; recommended: ${input.summary.recommended}`],
    ['Pass', input.summary.pass],
    ['Fail', input.summary.fail],
    ['of which waived', input.waivedCount],
    ['Not shown', input.summary.notShown],
    ['Undecided', input.summary.undecided],
    ['Not applicable', input.summary.notApplicable],
    ['Seal of the check', input.seal.seal],
    ['Cautions', cautionsFor({ startingPoint: input.startingPoint })],
  ];
  for (const [label, value] of rows)
    sheet.addRow([label, typeof value === 'string' ? neutralise(value) : value]);
  sheet.getColumn(1).font = { bold: true };
  sheet.getColumn(2).alignment = { wrapText: true, vertical: 'top', horizontal: 'left' };
}

/** The same words and figures as on the screen and in the letter. */
function addRoom(workbook: exceljs.Workbook, { room }: DocumentInput): void {
  if (room === null) return;
  const sheet = workbook.addWorksheet('Room to move');
  sheet.columns = [{ width: 14 }, { width: 44 }, { width: 24 }, { width: 40 }];
  sheet.addRow([neutralise(room.answer)]);
  sheet.addRow([]);
  sheet.addRow(['Clause', 'Rule', 'Limit', 'Holds at a binder content of']).font = { bold: true };
  for (const { clause, title, limit, holds } of room.lines)
    sheet.addRow([clause, title, limit, holds].map(neutralise));
  sheet.addRow([]);
  for (const note of room.notes) sheet.addRow([neutralise(note)]);
}

function addFindings(workbook: exceljs.Workbook, input: DocumentInput): void {
  const sheet = workbook.addWorksheet('Findings', { views: [{ state: 'frozen', ySplit: 1 }] });
  sheet.columns = columns;
  sheet.getRow(1).font = { bold: true };
  const items = new Map(input.items.map((item) => [findingKey(item.finding), item]));
  for (const finding of input.findings) {
    const item = items.get(findingKey(finding));
    const explanation = input.explanations[findingKey(finding)];
    const row = sheet.addRow(
      rowOf(finding, { waivedBecause: item?.waivedBecause ?? null, notes: item?.notes ?? [], explanation }),
    );
    row.alignment = { wrapText: true, vertical: 'top' };
  }
  sheet.autoFilter = { from: { row: 1, column: 1 }, to: { row: 1, column: columns.length } };
}

interface Beside {
  waivedBecause: string | null;
  notes: string[];
  explanation: Explanation | undefined;
}

function rowOf(finding: Finding, { waivedBecause, notes, explanation }: Beside): (string | number | null)[] {
  const act = nextActOf(finding, waivedBecause !== null);
  const source = finding.evidence[0]?.reported?.source ?? finding.evidence[0]?.source ?? null;
  const texts = {
    requirement: finding.requirement,
    next:
      act === null
        ? ''
        : `${nextActHeadings[act].heading}${mayLeaveOut(finding, waivedBecause !== null) ? '' : ' (required)'}`,
    cell: source === null ? '' : source.sheet === '' ? source.cell : `${source.sheet}!${source.cell}`,
  };
  return [
    finding.clause ?? 'does not add up',
    texts.requirement,
    finding.subject,
    finding.severity,
    finding.outcome,
    finding.borderline ? 'borderline' : '',
    finding.observed?.rounded ?? finding.observed?.text ?? null,
    finding.observed?.value ?? null,
    finding.observed?.unit ?? '',
    finding.limit?.min ?? null,
    finding.limit?.max ?? null,
    finding.margin,
    texts.next,
    finding.sentence,
    finding.reason,
    explanation?.whyThisLimit ?? '',
    toPassWords(explanation?.toPass ?? []),
    finding.wouldDecide ?? '',
    waivedBecause ?? '',
    notes.join('\n'),
    texts.cell,
  ].map((value) => (typeof value === 'string' ? neutralise(value) : value));
}
