import type { Outcome } from './finding';

/** Why something cannot be judged, and which outcome that is. Never a pass. */
export interface Obstacle {
  ok: false;
  outcome: Extract<Outcome, 'not shown' | 'undecided' | 'not applicable'>;
  reason: string;
  /** What would decide it, as an act: "State the design traffic." */
  wouldDecide?: string | undefined;
}

/** What gives single specimens, or values of its own, at a content that no trial has. */
export const COMPACT_WORDS = 'Compact and test specimens at the declared binder content.';

export const SINGLE_WORDS = 'State the value of each specimen.';
export const NUMBER_WORDS = 'Test on until the result is a number, and give that.';

export const AGREE_WORDS = 'Correct the raw readings, or the reported value, so that the two agree.';

/** For what no reading would change: limits that contradict, a table without its row, an error of ours. */
export const RULE_WORDS = 'Tell the agency: the rule, not the workbook, is to be put right.';

export function notShown(reason: string): Obstacle {
  return { ok: false, outcome: 'not shown', reason };
}

export function undecided(reason: string, wouldDecide?: string): Obstacle {
  return { ok: false, outcome: 'undecided', reason, wouldDecide };
}

export function notApplicable(reason: string): Obstacle {
  return { ok: false, outcome: 'not applicable', reason };
}
