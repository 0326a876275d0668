import { type Finding, findingKey, type ResolvedLimit } from '#rules/engine/finding';
import { resolvedLimitWords } from '#rules/rule-sets/limit-words';
import type { Moved } from '#shared/contracts/checks';

/** Findings whose outcome, judged value or limit is not what it was in the revision before. */
export function movedFindings(previous: readonly Finding[], present: readonly Finding[]): Moved[] {
  const before = new Map(previous.map((finding) => [findingKey(finding), finding]));
  const moved: Moved[] = [];
  for (const finding of present) {
    const earlier = before.get(findingKey(finding));
    if (earlier === undefined || !differs(earlier, finding)) continue;
    const limit = limitText(earlier.limit);
    moved.push({
      key: findingKey(finding),
      previousOutcome: earlier.outcome,
      previousText: observedText(earlier),
      previousLimit: limit === limitText(finding.limit) ? null : limit,
    });
  }
  return moved;
}

function differs(before: Finding, now: Finding): boolean {
  return (
    before.outcome !== now.outcome ||
    before.borderline !== now.borderline ||
    observedText(before) !== observedText(now) ||
    limitText(before.limit) !== limitText(now.limit)
  );
}

function observedText({ observed }: Finding): string | null {
  return observed === null ? null : observed.text;
}

function limitText(limit: ResolvedLimit | null): string | null {
  const words = limit === null ? '' : resolvedLimitWords(limit);
  return words === '' ? null : words;
}
