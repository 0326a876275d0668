import type { Outcome } from './finding';

/** Why something cannot be judged, and which outcome that is. Never a pass. */
export interface Obstacle {
  ok: false;
  outcome: Extract<Outcome, 'not shown' | 'undecided' | 'not applicable'>;
  reason: string;
}

export function notShown(reason: string): Obstacle {
  return { ok: false, outcome: 'not shown', reason };
}

export function undecided(reason: string): Obstacle {
  return { ok: false, outcome: 'undecided', reason };
}

export function notApplicable(reason: string): Obstacle {
  return { ok: false, outcome: 'not applicable', reason };
}
