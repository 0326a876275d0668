import type { NamedCause, RecomputedValue } from './analysis';
import { type AnalysisNode, evidenceOf } from './analysis-node';
import type { Evidence } from './finding';

type Known = Omit<RecomputedValue, 'inputs' | 'tolerance' | 'cause' | 'with'>;

/** What is dear to work out and seldom asked for. */
export interface Later {
  tolerance(): number | null;
  cause(): NamedCause | null;
}

export function recomputedValueOf(known: Known, later: Later): RecomputedValue {
  return new Recomputed(known, later);
}

/**
 * The dear parts are accessors of the class: one in an object literal gives every value a hidden class of its own,
 * which makes each look at it slow and keeps the whole analysis in memory until the next full collection.
 */
class Recomputed implements RecomputedValue {
  readonly quantity: string;
  readonly at: RecomputedValue['at'];
  readonly value: number;
  readonly unit: string;
  readonly origin: RecomputedValue['origin'];
  readonly symbol: string;
  readonly formula: string;
  readonly count: number;
  readonly specimens: RecomputedValue['specimens'];
  readonly reported: RecomputedValue['reported'];
  readonly agrees: boolean | null;
  readonly node: AnalysisNode;
  private readonly later: Later;
  private knownInputs: Evidence[] | undefined;
  private knownCause: NamedCause | null | undefined;

  constructor(known: Known, later: Later) {
    this.quantity = known.quantity;
    this.at = known.at;
    this.value = known.value;
    this.unit = known.unit;
    this.origin = known.origin;
    this.symbol = known.symbol;
    this.formula = known.formula;
    this.count = known.count;
    this.specimens = known.specimens;
    this.reported = known.reported;
    this.agrees = known.agrees;
    this.node = known.node;
    this.later = later;
  }

  get inputs(): Evidence[] {
    this.knownInputs ??= this.node.inputs.map(evidenceOf);
    return this.knownInputs;
  }

  get tolerance(): number | null {
    return this.later.tolerance();
  }

  get cause(): NamedCause | null {
    if (this.knownCause === undefined) this.knownCause = this.later.cause();
    return this.knownCause;
  }

  with(
    changes: Partial<Pick<RecomputedValue, 'value' | 'agrees'>>,
    later: Partial<Later> = {},
  ): RecomputedValue {
    const { later: own } = this;
    return new Recomputed(
      { ...this, ...changes },
      { tolerance: later.tolerance ?? own.tolerance, cause: later.cause ?? (() => this.cause) },
    );
  }
}
