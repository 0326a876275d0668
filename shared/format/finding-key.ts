import type { Finding } from '#rules/engine/finding';

/** A finding's address fragment: `ruleId~subject`, slugged. */
export function findingFragment(finding: Pick<Finding, 'rule' | 'subject'>): string {
  return `${slug(finding.rule)}~${slug(finding.subject)}`;
}

/** A clause as fragment leads to its first finding: `412.03(d)`. */
export function findByFragment<F extends Pick<Finding, 'rule' | 'subject' | 'clause'>>(
  findings: readonly F[],
  fragment: string,
): F | null {
  const wanted = decode(fragment.replace(/^#/, ''));
  if (wanted === '') return null;
  return (
    findings.find((finding) => findingFragment(finding) === wanted) ??
    findings.find((finding) => finding.clause === wanted) ??
    null
  );
}

export function slug(text: string): string {
  return text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z0-9.]+/g, '-')
    .replace(/^-+|-+$/g, '');
}

function decode(fragment: string): string {
  try {
    return decodeURIComponent(fragment);
  } catch {
    return fragment;
  }
}
