import { type Finding, findingKey } from '#rules/engine/finding';
import { countOf } from '#shared/format/numbers';

/** What to say after a check: which outcomes are not what they were. */
export function changedOutcomes(before: readonly Finding[], after: readonly Finding[]): string {
  const was = new Map(before.map((finding) => [findingKey(finding), finding.outcome]));
  const changed = after.filter((finding) => {
    const earlier = was.get(findingKey(finding));
    return earlier !== undefined && earlier !== finding.outcome;
  });
  if (changed.length === 0) return 'Checked again. No outcome changed.';
  const said = changed
    .slice(0, 5)
    .map((finding) => `${finding.clause ?? finding.title} ${finding.outcome}`)
    .join(', ');
  return `Checked again. Changed: ${countOf(changed.length, 'outcome')}, ${said}.`;
}
