import type { Conditions } from '../record';
import type { Formula, FormulaSymbol } from '../rule-sets/formula';
import type { FormulaMeasure } from '../rule-sets/measure';
import { doubtAbout } from './doubts';
import type { Evidence } from './finding';
import { NUMBER_WORDS, type Obstacle, undecided } from './obstacle';
import { labelOfRequest, type Sample, type SampleRequest, takeSample } from './sample';
import { statisticOf } from './statistic';
import type { World } from './world';

/** What one symbol of a formula stands for in this record: the value that a reading rule would judge. */
export interface FormulaInput {
  symbol: string;
  value: number;
  sample: Sample;
  evidence: Evidence;
}

/** The value of each symbol, or why one of them has none. Doubt weighs more than absence only where nothing is absent. */
export function formulaInputs(
  world: World,
  measure: FormulaMeasure,
  formula: Formula,
  at: Conditions,
): { ok: true; inputs: FormulaInput[] } | (Obstacle & { inputs: FormulaInput[] }) {
  const results = formula.symbols.map((symbol) => inputOf(world, measure, symbol, at));
  const inputs = results.flatMap((result) => (result.ok ? [result.input] : []));
  const obstacles = results.filter((result) => !result.ok);
  const [first] = obstacles;
  if (first === undefined) return { ok: true, inputs };
  const absent = obstacles.find(({ outcome }) => outcome === 'not shown');
  return { ...(absent ?? first), inputs };
}

/** Conditions under which a symbol's readings are looked for: the rule's, with the sieve that the symbol names. */
export function conditionsOfSymbol({ sieve }: FormulaSymbol, at: Conditions): Conditions {
  return sieve === null ? at : { ...at, sieve };
}

function inputOf(
  world: World,
  measure: FormulaMeasure,
  symbol: FormulaSymbol,
  at: Conditions,
): { ok: true; input: FormulaInput } | Obstacle {
  const { quantity } = symbol;
  const plain: SampleRequest = { quantity, at: conditionsOfSymbol(symbol, at) };
  const whole = takeSample(world, plain);
  // A gravity or a binder content has no specimens of its own, so no condition on specimens leaves any out.
  const hasSpecimens = whole.ok && whole.sample.items.some(({ specimen }) => specimen !== null);
  const request = hasSpecimens ? { ...plain, where: measure.where } : plain;
  const taken = hasSpecimens ? takeSample(world, request) : whole;
  const doubt = doubtAbout(world, request, taken.ok ? taken.sample : null);
  if (doubt !== null) return doubt;
  if (!taken.ok) return taken;
  const statistic = statisticOf({ sample: taken.sample, statistic: 'mean', within: null, hasMin: true });
  if (!statistic.ok) return statistic;
  const { judgeable } = statistic;
  if (judgeable.allowed !== null || judgeable.text !== null) {
    return undecided(
      `The ${labelOfRequest(world, request)} is only known as ${judgeable.text ?? 'a range'}, which a formula cannot use.`,
      NUMBER_WORDS,
    );
  }
  const { sample } = taken;
  const evidence = evidenceOf(world, symbol, request, sample, judgeable.value);
  return { ok: true, input: { symbol: symbol.symbol, value: judgeable.value, sample, evidence } };
}

/** A single value as it is; of several, their mean with each of them below. */
function evidenceOf(
  world: World,
  { symbol, quantity }: FormulaSymbol,
  request: SampleRequest,
  sample: Sample,
  value: number,
): Evidence {
  const [first, ...others] = new Set(sample.items.map((item) => item.evidence));
  if (first !== undefined && others.length === 0) return { ...first, symbol };
  return {
    quantity,
    value,
    unit: world.view.quantity(quantity)?.unit ?? '1',
    at: request.at,
    origin: 'recomputed',
    formula: `mean of ${sample.count}`,
    symbol,
    inputs: [first, ...others].filter((each) => each !== undefined),
    source: null,
  };
}
