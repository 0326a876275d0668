import { formatDate } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import type { NextAct } from '#shared/next-acts';
import type { DocumentInput, DocumentItem } from './document-input';

/** "We have reviewed …": what was judged, against what, and how the findings count. */
export function introduction(input: DocumentInput): string {
  const { summary, project, section } = input;
  const total = summary.pass + summary.fail + summary.notShown + summary.undecided + summary.notApplicable;
  const counts = joinWords([
    counted(summary.pass, 'passes', 'pass'),
    summary.fail === 0
      ? ''
      : `${counted(summary.fail, 'fails', 'fail')}${input.waivedCount === 0 ? '' : ` (${input.waivedCount} waived)`}`,
    counted(summary.notShown, 'is not shown', 'are not shown'),
    counted(summary.undecided, 'is undecided', 'are undecided'),
    counted(summary.notApplicable, 'does not apply', 'do not apply'),
  ]);
  const subject = `the mix design for ${project.number}, ${project.title}, against ${section}`;
  return `${openingOf(input, subject)} Of ${total} findings, ${counts}.`;
}

function openingOf({ kind, submittedOn }: DocumentInput, subject: string): string {
  const submitted = submittedOn === null ? '' : `, submitted on ${formatDate(submittedOn)}`;
  switch (kind) {
    case 'return':
      return `We have reviewed ${subject}${submitted}.`;
    case 'check of record':
      return `This is the check of record of ${subject}${submitted}; what the agency decides stands in its return.`;
    case 'pre-check':
      return `This is a check of ${subject}, made before submission; the agency's own check decides.`;
  }
}

const tallyWords: Record<NextAct, [one: string, many: string]> = {
  'put right': ['finding fails', 'findings fail'],
  send: ['is not shown', 'are not shown'],
  settle: ['is undecided', 'are undecided'],
  'for information': ['finding; nothing to do', 'findings; nothing to do'],
};

export function groupTally(act: NextAct, items: DocumentItem[]): string {
  const [one, many] = tallyWords[act];
  return countInFigures(items.length, one, many);
}

function counted(count: number, one: string, many: string): string {
  return count === 0 ? '' : countInFigures(count, one, many);
}

function joinWords(parts: string[]): string {
  const said = parts.filter((part) => part !== '');
  if (said.length < 2) return said.join('');
  return `${said.slice(0, -1).join(', ')} and ${said.at(-1)}`;
}
