import { plural } from '../rule-sets/words';
import type { ResolvedLimit } from './finding';
import { type Judgement, judge, type Rounder } from './judge';
import { COMPACT_WORDS, type Obstacle, SINGLE_WORDS, undecided } from './obstacle';
import type { Sample } from './sample';
import { type Judgeable, judgeableOf } from './statistic';

/** Every single value against the limit; the worst one is observed. */
export function judgeEach(
  sample: Sample,
  limit: ResolvedLimit,
  rounder: Rounder,
): { ok: true; judgement: Judgement; judgeable: Judgeable; note: string } | Obstacle {
  if (sample.interpolated) {
    return undecided(
      'The value is interpolated between trials, so the values of single specimens are not known.',
      COMPACT_WORDS,
    );
  }
  if (sample.meanOnly && sample.count > 1) {
    return undecided('Only the mean is known, not the values of the single specimens.', SINGLE_WORDS);
  }
  const judged = sample.items.map((item) => {
    const judgeable = judgeableOf(item, limit.min !== null);
    return { item, judgeable, judgement: judge(judgeable, limit, rounder) };
  });
  const [worst] = judged.toSorted((left, right) => rank(left.judgement) - rank(right.judgement));
  if (worst === undefined) return undecided('There is no single value to judge.');
  const outside = judged.filter(({ judgement }) => judgement.outcome === 'fail').length;
  const specimen = worst.item.specimen === null ? '' : ` Specimen ${worst.item.specimen} is the worst.`;
  const note =
    outside === 0 ? specimen.trim() : `${plural(outside, 'value')} of ${judged.length} outside.${specimen}`;
  return { ok: true, judgement: worst.judgement, judgeable: worst.judgeable, note };
}

/** Fails first, then what cannot be told, then the smallest margin. */
function rank({ outcome, margin }: Judgement): number {
  const worth = margin ?? 0;
  // Within ±1 whatever the margin, so that a large one never changes places with another outcome.
  return (outcome === 'fail' ? 0 : outcome === 'undecided' ? 3 : 6) + worth / (1 + Math.abs(worth));
}
