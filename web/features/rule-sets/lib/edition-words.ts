import type { EditionListItem } from '#shared/contracts/rule-sets';
import { formatDate } from '#shared/format/dates';

/** "from 1 January 2026", "1 January 2024 to 31 December 2025": when an edition governs. */
export function effectiveWords({ from, to }: Pick<EditionListItem, 'from' | 'to'>): string {
  if (from === null) return 'no date of effect yet';
  return to === null ? `from ${formatDate(from)}` : `${formatDate(from)} to ${formatDate(to)}`;
}

/** What a reader must know of an edition that is not in force. */
export function stateCaution(state: EditionListItem['state']): string | null {
  switch (state) {
    case 'draft':
    case 'in review':
      return 'Draft. Not in force; nothing is checked against it but its cases.';
    case 'superseded':
      return 'Superseded. It governs only contracts let while it was in force.';
    case 'not yet in force':
      return 'Published, not yet in force.';
    case 'withdrawn':
      return 'Withdrawn. No project may take it any more.';
    case 'in force':
      return null;
  }
}
