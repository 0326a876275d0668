import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces';
import type { Finding } from '#rules/engine/finding';
import { findingKey } from '#rules/engine/finding';
import { sectionOfClause } from '#shared/format/clause';
import { formatDate } from '#shared/format/dates';
import type { DocumentInput, DocumentItem } from './document-input';
import { itemTable, pageFrame, ruleLine } from './letter-definition';
import { introduction } from './letter-words';
import { pdfText } from './pdf-text';
import { printColours } from './print-colours';
import { roomSection } from './room-section';

/** All findings in clause order, as the ledger shows them. */
export function findingsDefinition(input: DocumentInput): TDocumentDefinitions {
  return {
    ...pageFrame(input),
    content: [
      pdfText(`${input.project.number} ${input.project.title}`, { color: printColours.ink2 }),
      pdfText(`${input.mixDesignation} revision ${input.revision}, ${input.contractor}`, {
        bold: true,
        fontSize: 14,
        margin: [0, 2, 0, 2],
      }),
      pdfText(input.mixDescription, { color: printColours.ink2 }),
      pdfText(`Checked on ${formatDate(input.checkedOn)} against ${input.section}.`, {
        margin: [0, 0, 0, 6],
      }),
      ruleLine(),
      pdfText(introduction(input), { margin: [0, 8, 0, 0] }),
      ...clauseGroups(input),
      ...roomSection(input),
    ],
  };
}

function clauseGroups(input: DocumentInput): Content[] {
  const groups = new Map<string, DocumentItem[]>();
  const known = new Map(input.items.map((item) => [findingKey(item.finding), item]));
  for (const finding of input.findings) {
    const item = known.get(findingKey(finding)) ?? asItem(finding);
    const section = sectionOfClause(finding.clause) ?? 'Does not add up';
    groups.set(section, [...(groups.get(section) ?? []), item]);
  }
  return [...groups].map(([section, items]) => itemTable(section, tally(items), items));
}

function asItem(finding: Finding): DocumentItem {
  return {
    group: 'for information',
    finding,
    waivedBecause: null,
    notes: [],
    previousText: null,
    toPass: '',
  };
}

function tally(items: DocumentItem[]): string {
  const counts = new Map<string, number>();
  for (const { finding } of items) counts.set(finding.outcome, (counts.get(finding.outcome) ?? 0) + 1);
  return [...counts].map(([outcome, count]) => `${count} ${outcome}`).join(' · ');
}
