import type { Content, TableCell, TDocumentDefinitions } from 'pdfmake/interfaces';
import { cautionsFor } from '#shared/cautions';
import { formatDate } from '#shared/format/dates';
import { shortHash } from '#shared/format/short-hash';
import { nextActHeadings, nextActs } from '#shared/next-acts';
import type { DocumentInput, DocumentItem } from './document-input';
import { gaugeSvg } from './gauge-svg';
import { groupTally, introduction } from './letter-words';
import { markSvg } from './mark-svg';
import { pdfRuns, pdfText } from './pdf-text';
import { printColours } from './print-colours';
import { roomSection } from './room-section';

const gaugeWidthPoints = 104;
const contentWidthPoints = 595.28 - 2 * 56;

/** The letter of a return, in the order put right, send, settle, for information. */
export function letterDefinition(input: DocumentInput): TDocumentDefinitions {
  return {
    ...pageFrame(input),
    content: [
      letterHead(input),
      addressees(input),
      pdfText(
        `${input.mixDesignation} revision ${input.revision}: ${input.disposition ?? 'findings before submission'}`,
        {
          bold: true,
          fontSize: 11,
          margin: [0, 14, 0, 6],
        },
      ),
      paragraph(introduction(input)),
      ...paragraphs(input.reason),
      ...paragraphs(input.textAbove),
      ...input.generalNotes.map((note) => paragraph(note, printColours.note)),
      ...groups(input),
      ...roomSection(input),
      ...paragraphs(input.textBelow, [0, 12, 0, 0]),
      ...signature(input),
    ],
  };
}

/** Running head and foot, fonts and page, alike for letter and findings. */
export function pageFrame(input: DocumentInput): Omit<TDocumentDefinitions, 'content'> {
  const reference = `${input.project.number} / ${input.mixDesignation} / r${input.revision}`;
  return {
    pageSize: 'A4',
    pageMargins: [56, 56, 56, 88],
    info: { title: `${reference}, ${input.disposition ?? 'findings'}`, author: input.agency.name },
    defaultStyle: { font: 'NotoSans', fontSize: 9, lineHeight: 1.15, color: printColours.ink },
    header: (page) =>
      page === 1
        ? null
        : {
            columns: [pdfText(input.agency.name, { bold: true }), pdfText(reference, { alignment: 'right' })],
            margin: [56, 28, 56, 0],
            fontSize: 8.5,
          },
    footer: (page, pages) => ({
      margin: [56, 10, 56, 0],
      stack: [
        ruleLine(0.5, printColours.rule2),
        {
          margin: [0, 4, 0, 0],
          fontSize: 7.5,
          color: printColours.ink2,
          columns: [
            {
              width: '*',
              stack: [
                pdfText(cautionsFor({ startingPoint: input.startingPoint })),
                pdfText(
                  `Check ${shortHash(input.seal.seal)}, ${formatDate(input.checkedOn)}. ${input.section}.`,
                ),
              ],
            },
            { width: 50, alignment: 'right', text: `${page} of ${pages}` },
          ],
        },
      ],
    }),
  };
}

export function ruleLine(width = 0.75, colour: string = printColours.ink): Content {
  return {
    canvas: [
      { type: 'line', x1: 0, y1: 0, x2: contentWidthPoints, y2: 0, lineWidth: width, lineColor: colour },
    ],
  };
}

function letterHead({ agency, date, project, mixDesignation, revision }: DocumentInput): Content {
  const { department, address, telephone, email } = agency.letterhead;
  const second = [department, address, telephone, email].filter((part) => part !== '').join(', ');
  return {
    stack: [
      {
        columns: [
          {
            width: '*',
            stack: [pdfText(agency.name, { bold: true, fontSize: 12 }), pdfText(second, { fontSize: 8.5 })],
          },
          {
            width: 190,
            alignment: 'right',
            fontSize: 8.5,
            stack: [
              formatDate(date),
              pdfText(`Our reference ${project.number} / ${mixDesignation} / r${revision}`),
            ],
          },
        ],
        margin: [0, 0, 0, 6],
      },
      ruleLine(1),
    ],
  };
}

function addressees({ to, copies, contractor }: DocumentInput): Content {
  const lines = to.map(({ name, function: post }) => (post === '' ? name : `${name}, ${post}`));
  const copyLine = copies
    .map(({ name, function: post }) => (post === '' ? name : `${name}, ${post}`))
    .join('; ');
  return {
    margin: [0, 14, 0, 0],
    stack: [
      ...lines.map((text) => pdfText(text)),
      pdfText(contractor),
      ...(copyLine === '' ? [] : [pdfText(`Copy to ${copyLine}`, { color: printColours.ink2 })]),
    ],
  };
}

function paragraph(text: string, color: string = printColours.ink): Content {
  return pdfText(text, { margin: [0, 0, 0, 6], color });
}

function paragraphs(text: string, margin: [number, number, number, number] = [0, 0, 0, 6]): Content[] {
  return text
    .split(/\n{2,}/)
    .map((part) => part.trim())
    .filter((part) => part !== '')
    .map((part) => pdfText(part, { margin }));
}

function groups(input: DocumentInput): Content[] {
  return nextActs.flatMap((act) => {
    const items = input.items.filter(({ group }) => group === act);
    if (items.length === 0) return [];
    return [itemTable(`${nextActHeadings[act].heading}`, groupTally(act, items), items)];
  });
}

/** One table a group: its heading is the repeated header row, so it stays with its rows over a page break. */
export function itemTable(heading: string, tally: string, items: DocumentItem[]): Content {
  const head: TableCell[] = [
    {
      colSpan: 4,
      margin: [0, 4, 0, 2],
      text: [
        ...pdfRuns(heading, { bold: true, fontSize: 9.5 }),
        ...pdfRuns(`   ${tally}`, { color: printColours.ink2, fontSize: 8.5 }),
      ],
    },
    {},
    {},
    {},
  ];
  return {
    margin: [0, 8, 0, 0],
    table: {
      headerRows: 1,
      keepWithHeaderRows: 1,
      dontBreakRows: true,
      widths: [12, 58, '*', gaugeWidthPoints],
      body: [head, ...items.map(itemRow)],
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
  };
}

function itemRow({ finding, waivedBecause, notes, previousText, toPass }: DocumentItem): TableCell[] {
  const gauge = gaugeSvg(finding, gaugeWidthPoints);
  const asides = [
    waivedBecause === null ? '' : `Waived: ${waivedBecause}`,
    previousText === null ? '' : `Was ${previousText}.`,
    cellWords(finding),
    finding.outcome === 'pass' ? '' : finding.reason,
    toPass === '' ? '' : `To pass: ${toPass}`,
    finding.wouldDecide === null ? '' : `What would decide it: ${finding.wouldDecide}`,
  ].filter((aside) => aside !== '');
  return [
    { svg: markSvg(finding.outcome, waivedBecause !== null), width: 9, margin: [0, 1.5, 0, 0] },
    pdfText(finding.clause ?? '', { bold: true }),
    {
      stack: [
        pdfText(finding.sentence, { bold: true }),
        ...asides.map((aside) => pdfText(aside, { italics: true, color: printColours.ink2, fontSize: 8.5 })),
        ...notes.map((note) => pdfText(note, { color: printColours.note })),
      ],
    },
    gauge === null ? '' : { svg: gauge, width: gaugeWidthPoints },
  ];
}

function cellWords({ evidence }: DocumentItem['finding']): string {
  const judged = evidence[0];
  if (judged?.reported?.source) {
    const { sheet, cell } = judged.reported.source;
    return `${place(sheet, cell)} reports ${judged.reported.text}.`;
  }
  return judged?.source ? `${place(judged.source.sheet, judged.source.cell)}.` : '';
}

function place(sheet: string, cell: string): string {
  return sheet === '' ? cell : `${sheet} ${cell}`;
}

function signature({ signedBy, agency, enclosesWorkbook }: DocumentInput): Content[] {
  if (signedBy === null) return [];
  return [
    {
      unbreakable: true,
      margin: [0, 14, 0, 0],
      stack: [
        ...(agency.letterhead.closing === ''
          ? []
          : [pdfText(agency.letterhead.closing, { margin: [0, 0, 0, 8] })]),
        pdfText(signedBy.name, { bold: true }),
        pdfText(`${signedBy.function}, ${agency.name}`),
        ...(enclosesWorkbook
          ? [pdfText('Enclosed: findings workbook', { margin: [0, 6, 0, 0], color: printColours.ink2 })]
          : []),
      ],
    },
  ];
}
