import type { ReturnItem } from '#shared/contracts/returns';
import { nextActHeadings, nextActs } from '#shared/next-acts';

export interface LetterGroup {
  group: ReturnItem['group'];
  title: string;
  detail: string;
  items: ReturnItem[];
}

/** The letter's order: what to do next. Groups without an item are left out, as in the letter. */
export function letterGroups(items: readonly ReturnItem[]): LetterGroup[] {
  return nextActs.flatMap((group) => {
    const own = items.filter((item) => item.group === group);
    const { heading, help } = nextActHeadings[group];
    return own.length === 0 ? [] : [{ group, title: heading, detail: help, items: own }];
  });
}
