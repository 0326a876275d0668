import { type Finding, findingKey } from '#rules/engine/finding';
import type { Moved } from '#shared/contracts/checks';
import type { ReturnItem } from '#shared/contracts/returns';
import { mayLeaveOut, nextActOf, nextActs } from '#shared/next-acts';

export interface ReturnSources {
  findings: readonly Finding[];
  waivers: readonly { finding: string; reason: string; toBeReturned: boolean; sentAt: Date | null }[];
  /** Notes to be returned, and only those. */
  notes: readonly { finding: string | null; text: string }[];
  /** Keys of the optional items that go with it. */
  included: ReadonlySet<string>;
  moved: readonly Moved[];
}

/**
 * What a letter may carry, in its order. A waiver that stays internal moves its finding to "for your information"
 * without a word of why: the outcome stays fail, and the reason never leaves the agency.
 */
export function returnItems({ findings, waivers, notes, included, moved }: ReturnSources): ReturnItem[] {
  const waiverOf = new Map(waivers.map((waiver) => [waiver.finding, waiver]));
  const previous = new Map(moved.map(({ key, previousText }) => [key, previousText]));
  const items = findings.flatMap((finding): ReturnItem[] => {
    const key = findingKey(finding);
    const waiver = waiverOf.get(key);
    const own = notes.filter((note) => note.finding === key).map(({ text }) => text);
    const group = nextActOf(finding, waiver !== undefined) ?? (own.length > 0 ? 'for information' : null);
    if (group === null) return [];
    const optional = mayLeaveOut(finding, waiver !== undefined) && own.length === 0;
    return [
      {
        key,
        group,
        included: !optional || included.has(key),
        optional,
        finding,
        waived: waiver?.toBeReturned ? waiver.reason : null,
        notes: own,
        previousText: previous.get(key) ?? null,
      },
    ];
  });
  return nextActs.flatMap((act) => items.filter(({ group }) => group === act));
}

/** A new draft carries everything that may be left out. */
export function includedAtFirst(sources: Omit<ReturnSources, 'included'>): string[] {
  return returnItems({ ...sources, included: new Set() })
    .filter(({ optional }) => optional)
    .map(({ key }) => key);
}
