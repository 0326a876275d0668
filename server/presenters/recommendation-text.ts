import { type Finding, findingKey } from '#rules/engine/finding';
import { countOf, countWord } from '#shared/format/numbers';

/** "Two required rules fail without a waiver, one is not shown." */
export function recommendationText(findings: readonly Finding[], waived: ReadonlySet<string>): string {
  const required = findings.filter((finding) => finding.severity === 'required');
  const open = (outcome: Finding['outcome'], group: readonly Finding[]) =>
    group.filter((finding) => finding.outcome === outcome && !waived.has(findingKey(finding))).length;
  const blocking = clauses([
    [open('fail', required), 'fails without a waiver', 'fail without a waiver'],
    [open('not shown', required), 'is not shown', 'are not shown'],
    [open('undecided', required), 'is undecided', 'are undecided'],
  ]);
  if (blocking.length > 0) return sentence(blocking, 'required finding');
  const advisory = findings.filter((finding) => finding.severity === 'advisory');
  const noted = clauses([
    [
      findings.filter((finding) => finding.outcome === 'fail' && waived.has(findingKey(finding))).length,
      'fails and is waived',
      'fail and are waived',
    ],
    [
      open('fail', advisory) + open('not shown', advisory) + open('undecided', advisory),
      'is advisory and not a pass',
      'are advisory and not a pass',
    ],
    [
      required.filter((finding) => finding.outcome === 'pass' && finding.borderline).length,
      'passes borderline',
      'pass borderline',
    ],
  ]);
  if (noted.length > 0) return sentence(noted, 'finding');
  return 'Every finding that applies passes.';
}

type Clause = { count: number; words: string };

function clauses(rows: [number, string, string][]): Clause[] {
  return rows
    .filter(([count]) => count > 0)
    .map(([count, one, many]) => ({ count, words: count === 1 ? one : many }));
}

function sentence(parts: Clause[], noun: string): string {
  const [first, ...others] = parts;
  if (first === undefined) return '';
  const subject = countOf(first.count, noun);
  const rest = others.map(({ count, words }) => `${countWord(count)} ${words}`);
  const text = [`${subject} ${first.words}`, ...rest].join(', ');
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}
