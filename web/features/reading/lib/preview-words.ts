import type { ReadingPreview } from '#shared/contracts/corrections';
import { countOf } from '#shared/format/numbers';
import { withUnit } from '#shared/format/units';

type Change = ReadingPreview['readings'][number];
type PreviewReading = NonNullable<Change['before']>;

/** "Two readings come, one goes, three change." */
export function readingCountWords({ added, removed, changed }: ReadingPreview['counts']): string {
  const parts = [
    added > 0 ? `${countOf(added, 'reading')} ${added === 1 ? 'comes' : 'come'}` : '',
    removed > 0 ? `${countOf(removed, 'reading')} ${removed === 1 ? 'goes' : 'go'}` : '',
    changed > 0 ? `${countOf(changed, 'reading')} ${changed === 1 ? 'changes' : 'change'}` : '',
  ].filter((part) => part !== '');
  if (parts.length === 0) return 'No reading changes.';
  const text = parts.join(', ');
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

export function valueWords(reading: PreviewReading | null): string | null {
  if (reading === null) return null;
  if (reading.value === null) return reading.qualifier ?? '';
  const sign = reading.qualifier === '<' || reading.qualifier === '>' ? `${reading.qualifier} ` : '';
  return `${sign}${withUnit(String(reading.value), reading.unit)}`;
}

/** True where a proposal would leave everything as it is. */
export function changesNothing({ counts, findings, attributes, doubts }: ReadingPreview): boolean {
  const readings = counts.added + counts.removed + counts.changed;
  return (
    readings === 0 &&
    findings.length === 0 &&
    attributes.length === 0 &&
    doubts.before === doubts.after &&
    doubts.raised.length === 0
  );
}
