import { formatDate } from '#shared/format/dates';
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
  const opening =
    input.kind === 'return'
      ? `We have reviewed ${subject}${input.submittedOn === null ? '' : `, submitted on ${formatDate(input.submittedOn)}`}.`
      : `This is a check of ${subject}, made before submission; the agency's own check decides.`;
  return `${opening} Of ${total} findings, ${counts}.`;
}

const tallyWords: Record<NextAct, [one: string, many: string]> = {
  'put right': ['finding fails', 'findings fail'],
  send: ['is not shown', 'are not shown'],
  settle: ['is undecided', 'are undecided'],
  'for information': ['finding; nothing to do', 'findings; nothing to do'],
};

export function groupTally(act: NextAct, items: DocumentItem[]): string {
  const [one, many] = tallyWords[act];
  return `${items.length} ${items.length === 1 ? one : many}`;
}

function counted(count: number, one: string, many: string): string {
  return count === 0 ? '' : `${count} ${count === 1 ? one : many}`;
}

function joinWords(parts: string[]): string {
  const said = parts.filter((part) => part !== '');
  if (said.length < 2) return said.join('');
  return `${said.slice(0, -1).join(', ')} and ${said.at(-1)}`;
}
