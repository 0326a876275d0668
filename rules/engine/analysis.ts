import type { Conditions, Reading } from '../record';
import type { CreepFailure } from './analysis-creep';
import type { AnalysisNode } from './analysis-node';
import type { Evidence } from './finding';

/** A named mistake that reproduces a reported value to its displayed digits. */
export interface NamedCause {
  /** `dust-over-total-binder` */
  id: string;
  /** "divides by total, not effective, binder" */
  text: string;
  value: number;
}

/** A derived quantity that the engine computed, beside what the workbook states for it. */
export interface RecomputedValue {
  quantity: string;
  at: Conditions;
  value: number;
  unit: string;
  origin: 'recomputed' | 'interpolated' | 'converted';
  symbol: string;
  /** In trade symbols: `100 − Gmb·Ps/Gsb`. */
  formula: string;
  inputs: Evidence[];
  /** Specimens behind the value: the fewest of the inputs, or of the trials used where interpolated. */
  count: number;
  /** One value per specimen where the inputs allow it, else only the mean. */
  specimens: { specimen: string; value: number }[];
  reported: Reading | null;
  /** Half a unit of the last displayed digit, propagated; null where nothing is reported. */
  tolerance: number | null;
  /** |reported − recomputed| ≤ tolerance; null where nothing is reported. */
  agrees: boolean | null;
  /** The one named cause that reproduces the reported value, if exactly one does. */
  cause: NamedCause | null;
  /** The calculation itself, to be repeated with another input. */
  node: AnalysisNode;
  /** The same value otherwise told: in another unit, or by another tolerance. */
  with(
    changes: Partial<Pick<RecomputedValue, 'value' | 'agrees'>>,
    later?: { tolerance?: () => number | null; cause?: () => NamedCause | null },
  ): RecomputedValue;
}

export interface DesignPoint {
  /** The stated job-mix binder content, the one that is judged; %. */
  declaredBinderContent: number | null;
  /** The one computed from the trial points at the target air voids; analysis only; %. */
  computedBinderContent: number | null;
  targetAirVoids: number;
  fit: 'quadratic' | 'linear';
  /** The trial whose binder content is within 0.05 of the declared one. */
  trial: string | null;
}

/** A tested binder content with what its own raw readings give. */
export interface TestedContent {
  trial: string;
  binderContent: AnalysisNode;
  values: AnalysisNode[];
}

export interface Analysis {
  recomputed: RecomputedValue[];
  designPoint: DesignPoint;
  /** In rising order of binder content; the design among them where it was tested itself. */
  testedContents: TestedContent[];
  /** Creep readings of the design that give no compliance. */
  creepFailures: CreepFailure[];
}

export interface AnalysisOptions {
  targetAirVoids: number;
  fit: 'quadratic' | 'linear';
}
