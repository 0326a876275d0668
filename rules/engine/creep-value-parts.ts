import type { CreepComplianceMeasure } from '../rule-sets/measure';
import { numberWords } from '../rule-sets/words';
import type { CreepPoint } from './creep-points';
import type { Evidence, ResolvedLimit } from './finding';
import type { Obstacle } from './obstacle';
import type { Judgeable } from './statistic';

/** A compliance to be judged, 1/GPa: a measured mean, or the fitted curve or one of its bounds. */
export interface CreepValue {
  ok: true;
  /** One value, or both bounds where both ends of a limit could be crossed. */
  judgeables: { judgeable: Judgeable; statistic: string }[];
  count: number;
  evidence: Evidence[];
  /** Marks of a fitted or extrapolated value, as a sentence. */
  note: string;
}

/** Known, and still not to be judged: beyond what the rule allows. Its estimate is shown. */
export interface CreepBeyond extends Obstacle {
  estimate: number;
  count: number;
  evidence: Evidence[];
}

export interface CreepRequest {
  measure: CreepComplianceMeasure;
  points: readonly CreepPoint[];
  limit: Pick<ResolvedLimit, 'min' | 'max'>;
}

/** A plain number with what it is: `mean`, `fitted`, `lower 95 % bound`. */
export function plainValue(value: number, statistic: string): CreepValue['judgeables'][number] {
  return { judgeable: { value, text: null, allowed: null }, statistic };
}

export function boundWords(bound: 'lower' | 'upper', confidence: number): string {
  return `${bound} ${percentWords(confidence)} bound`;
}

export function percentWords(confidence: number): string {
  return `${numberWords(settled(confidence * 100))} %`;
}

/** As every numeric result: 12 significant digits. */
export function settled(value: number): number {
  return Number(value.toPrecision(12));
}
