import type { Finding } from '#rules/engine/finding';

/** What the contractor would do next about a finding, in the order of the letter. */
export const nextActs = ['put right', 'send', 'settle', 'for information'] as const;
export type NextAct = (typeof nextActs)[number];

export const nextActHeadings: Record<NextAct, { heading: string; help: string }> = {
  'put right': { heading: 'Put right', help: 'fails without a waiver, and what does not add up' },
  send: { heading: 'Send', help: 'not shown' },
  settle: { heading: 'Settle', help: 'undecided, with what would decide it' },
  'for information': { heading: 'For your information', help: 'waived and borderline; nothing to do' },
};

/** Null where there is nothing to do and nothing to know: a comfortable pass, or not applicable. */
export function nextActOf(finding: Pick<Finding, 'outcome' | 'borderline'>, waived: boolean): NextAct | null {
  switch (finding.outcome) {
    case 'fail':
      return waived ? 'for information' : 'put right';
    case 'not shown':
      return 'send';
    case 'undecided':
      return 'settle';
    case 'pass':
      return finding.borderline ? 'for information' : null;
    case 'not applicable':
      return null;
  }
}

/** Whether a letter may leave the finding out: all but required fails, not shown and undecided. */
export function mayLeaveOut(
  finding: Pick<Finding, 'outcome' | 'borderline' | 'severity'>,
  waived: boolean,
): boolean {
  const act = nextActOf(finding, waived);
  return act === 'for information' || finding.severity === 'advisory';
}
