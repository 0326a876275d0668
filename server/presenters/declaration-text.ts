import type { Finding } from '#rules/engine/finding';
import { countInFigures } from '#shared/format/numbers';

export interface DeclarationInput {
  mixDesignation: string;
  revision: number;
  projectNumber: string;
  /** "Section 412 Dense-graded asphalt mixtures, edition 2026" */
  section: string;
  findings: Pick<Finding, 'outcome' | 'clause' | 'title' | 'subject'>[];
  /** Cells whose meaning is not confirmed, "Trials F20", and attributes in conflict. */
  doubts: string[];
}

/** What a contractor declares on submitting. It lists what the contractor knows to be open, so nobody is surprised. */
export function declarationText(input: DeclarationInput): string {
  const { findings, doubts } = input;
  const open = [
    listed('fail', 'fails', 'fail', findings),
    listed('not shown', 'is not shown', 'are not shown', findings),
    listed('undecided', 'is undecided', 'are undecided', findings),
    doubts.length === 0
      ? null
      : `${countInFigures(doubts.length, 'doubt is', 'doubts are')} not answered: ${doubts.join('; ')}.`,
  ].filter((line) => line !== null);
  const opening =
    `We submit ${input.mixDesignation} revision ${input.revision} for ${input.projectNumber} ` +
    `under ${input.section}. The workbook holds our own test results, read as shown.`;
  const known =
    open.length === 0
      ? 'Nothing is known to be open.'
      : ['We know that:', ...open.map((line) => `– ${line}`)].join('\n');
  return `${opening}\n${known}`;
}

function listed(
  outcome: Finding['outcome'],
  one: string,
  many: string,
  findings: DeclarationInput['findings'],
): string | null {
  const named = findings.filter((finding) => finding.outcome === outcome).map(nameOf);
  if (named.length === 0) return null;
  return `${countInFigures(named.length, one, many)}: ${named.join('; ')}.`;
}

function nameOf({ clause, title, subject }: DeclarationInput['findings'][number]): string {
  const general = subject === 'mix' || subject === 'design point';
  const named = general ? title : `${title}, ${subject}`;
  return clause === null ? named : `${clause} ${named}`;
}
