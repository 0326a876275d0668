import { type Finding, findingKey, type ResolvedLimit } from '#rules/engine/finding';
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

/** "at least 14.0", "0.6 to 1.2": a limit as the ledger writes it. */
export function limitText(limit: ResolvedLimit | null): string | null {
  if (limit === null) return null;
  const figure = (value: number) => value.toFixed(Math.min(limit.decimals, 20));
  const { min, max } = limit;
  if (limit.oneOf !== null) return limit.oneOf.join(', ');
  if (min !== null && max !== null) return `${figure(min)} to ${figure(max)}`;
  if (min !== null) return `${limit.minExclusive ? 'more than' : 'at least'} ${figure(min)}`;
  if (max !== null) return `${limit.maxExclusive ? 'less than' : 'at most'} ${figure(max)}`;
  return null;
}
