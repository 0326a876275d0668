import type { Content, TableCell } from 'pdfmake/interfaces';
import type { DocumentInput } from './document-input';
import { pdfRuns, pdfText } from './pdf-text';
import { printColours } from './print-colours';

/** The last group of a letter: the same words and figures as on the screen and in the workbook. */
export function roomSection({ room }: DocumentInput): Content[] {
  if (room === null) return [];
  const head: TableCell[] = [
    { colSpan: 4, margin: [0, 4, 0, 2], text: pdfRuns('Room to move', { bold: true, fontSize: 9.5 }) },
    {},
    {},
    {},
  ];
  const rows = room.lines.map(({ clause, title, limit, holds }): TableCell[] => [
    pdfText(clause, { bold: true }),
    pdfText(title),
    pdfText(limit, { color: printColours.ink2 }),
    pdfText(holds),
  ]);
  return [
    {
      margin: [0, 8, 0, 0],
      table: {
        headerRows: 1,
        keepWithHeaderRows: 1,
        dontBreakRows: true,
        widths: [58, '*', 92, 150],
        body: [head, ...rows],
      },
      layout: {
        hLineWidth: (line) => (line === 0 ? 0.9 : line === 1 ? 0 : 0.4),
        vLineWidth: () => 0,
        hLineColor: (line) => (line === 0 ? printColours.ink : printColours.rule),
        paddingLeft: () => 0,
        paddingRight: () => 4,
        paddingTop: () => 2.5,
        paddingBottom: () => 2.5,
      },
    },
    pdfText(room.answer, { bold: true, margin: [0, 4, 0, 0] }),
    ...room.notes.map((note) => pdfText(note, { color: printColours.ink2, fontSize: 8.5 })),
  ];
}
