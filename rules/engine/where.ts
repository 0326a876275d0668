import type { Where } from '../rule-sets/measure';
import { quantityPhrase } from '../rule-sets/words';
import { type Obstacle, undecided } from './obstacle';
import { type ResolvedInterval, resolveInterval } from './resolve-limit';
import type { Sample, SampleItem, SampleRequest } from './sample';
import { select } from './select';
import type { World } from './world';

/**
 * The items whose specimen meets every condition. One that is not met settles that a specimen does not count,
 * whatever is known of the others; a specimen of which it is not settled leaves all undecided.
 */
export function applyWhere(
  world: World,
  request: SampleRequest,
  sample: Sample,
): { ok: true; items: SampleItem[] } | Obstacle {
  const conditions: { where: Where; interval: ResolvedInterval }[] = [];
  for (const where of request.where ?? []) {
    const unit = world.view.quantity(where.quantity)?.unit ?? '1';
    const interval = resolveInterval(world, where, request.at, { written: unit, wanted: unit });
    if (!interval.ok) return interval;
    conditions.push({ where, interval: interval.interval });
  }
  const items: SampleItem[] = [];
  for (const item of sample.items) {
    const values = conditions.map(({ where, interval }) => {
      const value = valueOfSpecimen(world, where, request, item);
      return { where, isMet: value === null ? null : isInside(value, interval) };
    });
    if (values.some(({ isMet }) => isMet === false)) continue;
    const unknown = values.find(({ isMet }) => isMet === null)?.where;
    if (unknown) return undecided(unknownReason(world, unknown, item), stateWords(world, unknown));
    items.push(item);
  }
  return { ok: true, items };
}

function isInside(value: number, { min, max, minExclusive, maxExclusive }: ResolvedInterval): boolean {
  const isAbove = min === null || (minExclusive ? value > min : value >= min);
  const isBelow = max === null || (maxExclusive ? value < max : value <= max);
  return isAbove && isBelow;
}

/** The one sure value of another quantity on the same specimen, recomputed where it can be, else as read. */
function valueOfSpecimen(
  world: World,
  where: Where,
  request: SampleRequest,
  item: SampleItem,
): number | null {
  const trial = request.at.trial ?? 'design';
  const laboratory = request.at.laboratory ?? 'contractor';
  const sameTest = (at: SampleItem['at']) =>
    (at.trial ?? 'design') === trial && (at.laboratory ?? 'contractor') === laboratory;
  const label = where.quantity;
  const wanted = where.at;

  const recomputed = (world.recomputed.get(where.quantity) ?? [])
    .filter(({ at }) => sameTest(at))
    .flatMap((value) => {
      const ofSpecimen = value.specimens.find(({ specimen }) => specimen === item.specimen);
      if (ofSpecimen) return [{ at: value.at, value: ofSpecimen.value }];
      return (value.at.specimen ?? null) === item.specimen ? [{ at: value.at, value: value.value }] : [];
    });
  const read = (world.readings.get(where.quantity) ?? [])
    .filter(({ at }) => sameTest(at) && (at.specimen ?? null) === item.specimen)
    .map(({ at, value, fault, reading }) => ({
      at,
      value: fault === null && reading.qualifier === undefined ? value : null,
    }));
  for (const candidates of [recomputed, read]) {
    if (candidates.length === 0) continue;
    const selected = select({ world, candidates, wanted, label, preferPlain: true });
    if (!selected.ok) continue;
    const values = new Set(selected.chosen.map(({ value }) => value));
    const [only] = values;
    if (values.size === 1 && only !== undefined) return only;
  }
  return null;
}

function stateWords(world: World, where: Where): string {
  const quantity = world.view.quantity(where.quantity);
  return `State ${quantity ? quantityPhrase(quantity, where.at) : where.quantity} of each specimen.`;
}

function unknownReason(world: World, where: Where, item: SampleItem): string {
  const quantity = world.view.quantity(where.quantity);
  const name = quantity ? quantityPhrase(quantity, where.at) : where.quantity;
  const specimen = item.specimen === null ? 'the specimens' : `specimen ${item.specimen}`;
  return `Whether ${specimen} counts is not known: ${name} is missing or doubtful.`;
}
