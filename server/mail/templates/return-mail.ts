import { cautionsFor } from '#shared/cautions';
import { type NextAct, nextActHeadings, nextActs } from '#shared/next-acts';
import type { DocumentInput, DocumentItem } from '../../documents/document-input';
import { introduction } from '../../documents/letter-words';
import { type MailContent, mailContent } from './mail-content';

/** The e-mail that carries a return: the decision, what to do next, and what is enclosed. */
export function returnMail(input: DocumentInput, { address }: { address: string }): MailContent {
  const enclosed = input.enclosesWorkbook ? 'the letter (PDF) and the findings workbook' : 'the letter (PDF)';
  return mailContent({
    subject: returnSubject(input),
    paragraphs: [
      input.to.map(({ name }) => name).join(', '),
      `${input.mixDesignation} revision ${input.revision}: ${input.disposition ?? ''}`,
      introduction(input),
      input.reason,
      ...nextActs.map((act) => groupText(act, input.items)),
      `Enclosed: ${enclosed}.`,
      `Open it, answer the notes and send the next revision at ${address}`,
      cautionsFor({ startingPoint: input.startingPoint }),
      input.signedBy === null
        ? ''
        : `${input.signedBy.name}\n${input.signedBy.function}, ${input.agency.name}`,
    ],
  });
}

export function returnSubject(
  input: Pick<DocumentInput, 'project' | 'mixDesignation' | 'revision' | 'disposition'>,
): string {
  return `${input.project.number} / ${input.mixDesignation} / r${input.revision}: ${input.disposition ?? 'findings'}`;
}

function groupText(act: NextAct, items: DocumentItem[]): string {
  const own = items.filter(({ group }) => group === act);
  if (own.length === 0) return '';
  const lines = own.map(({ finding, notes }) =>
    [
      `${finding.clause ?? 'Does not add up'}  ${finding.sentence}`,
      ...notes.map((note) => `    ${note}`),
    ].join('\n'),
  );
  return [nextActHeadings[act].heading, ...lines].join('\n');
}
