import { type Disposition, type Finding, findingKey, type Summary } from './finding';

type Weighed = Pick<Finding, 'rule' | 'subject' | 'severity' | 'outcome' | 'borderline'>;

/**
 * The disposition that findings and waivers speak for. Rejected is never recommended, and only a fail can be
 * waived: a waiver of anything else changes nothing here.
 */
export function recommendDisposition(
  findings: readonly Weighed[],
  waivedKeys: ReadonlySet<string>,
): Disposition {
  const isWaived = (finding: Weighed) => finding.outcome === 'fail' && waivedKeys.has(findingKey(finding));
  const stands = (finding: Weighed) => isUnsettled(finding) && !isWaived(finding);
  if (findings.some((finding) => finding.severity === 'required' && stands(finding)))
    return 'revise and resubmit';
  const isNoted = findings.some(
    (finding) =>
      isWaived(finding) ||
      (finding.severity === 'advisory' && isUnsettled(finding)) ||
      (finding.severity === 'required' && finding.outcome === 'pass' && finding.borderline),
  );
  return isNoted ? 'approved as noted' : 'approved';
}

/** How many findings have each outcome, consistency findings among them, and what they speak for. */
export function summarise(
  findings: readonly (Weighed & Pick<Finding, 'kind'>)[],
  waivedKeys: ReadonlySet<string> = new Set(),
): Summary {
  const count = (outcome: Finding['outcome']) => findings.filter((each) => each.outcome === outcome).length;
  return {
    pass: count('pass'),
    fail: count('fail'),
    notShown: count('not shown'),
    undecided: count('undecided'),
    notApplicable: count('not applicable'),
    borderline: findings.filter((each) => each.borderline).length,
    doesNotAddUp: findings.filter((each) => each.kind === 'consistency' && each.outcome === 'fail').length,
    recommended: recommendDisposition(findings, waivedKeys),
  };
}

function isUnsettled({ outcome }: Weighed): boolean {
  return outcome === 'fail' || outcome === 'not shown' || outcome === 'undecided';
}
