import type { Conditions } from '../record';
import { doubtAbout } from './doubts';
import { type Obstacle, undecided } from './obstacle';
import { labelOfRequest, takeSample } from './sample';
import { statisticOf } from './statistic';
import type { World } from './world';

/** The mean of a quantity, for a condition or for a limit that depends on it. */
export function quantityValue(
  world: World,
  quantity: string,
  at: Conditions,
): { ok: true; value: number } | Obstacle {
  const request = { quantity, at };
  const result = takeSample(world, request);
  const doubt = doubtAbout(world, request, result.ok ? result.sample : null);
  if (doubt) return doubt;
  if (!result.ok) return result;
  const { items } = result.sample;
  const censored = items.find((item) => item.value === null || item.qualifier !== null);
  if (censored) {
    return undecided(
      `${labelOfRequest(world, request)} is only known as ${censored.evidence.text ?? 'a result without a number'}`,
    );
  }
  // The mean as a rule on this quantity would judge it.
  const mean = statisticOf({ sample: result.sample, statistic: 'mean', within: null, hasMin: true });
  return mean.ok ? { ok: true, value: mean.judgeable.value } : mean;
}
