import type { RuleInput } from '#rules/rule-sets/schema';
import type { Wanted } from './conditions';
import { type Draw, decimal, written } from './draw';
import type { ReadingInput } from './parts';
import type { Candidate } from './quantities';

type Wheres = NonNullable<RuleInput['measure']['where']>;

/** Only conditions on specimens are over these. */
const ON_SPECIMENS = ['overlay-cycles', 'permeability'];

/** Which specimens count, by what else is known of them: met, not met, at the end, missing or censored. */
export function drawWhere(
  draw: Draw,
  candidate: Candidate,
  wanted: Wanted,
  count: number,
  isAsked = false,
): { where: Wheres; readings: ReadingInput[] } {
  const where: Wheres = [];
  const readings: ReadingInput[] = [];
  if (candidate.isOfAggregate || !(draw.chance(16) || isAsked)) return { where, readings };
  for (const quantity of draw.chance(25) ? ON_SPECIMENS : ON_SPECIMENS.slice(0, 1)) {
    const min = draw.whole(60, 70);
    const max = min + draw.whole(0, 20);
    const ends = { min: written(min, 1), max: { value: decimal(max, 1), exclusive: draw.chance(30) } };
    where.push({ quantity, ...draw.oneOf([ends, { min: ends.min }, { max: ends.max }]) });
    for (let place = 0; place < count; place += 1) {
      const { trial, laboratory } = wanted.readings(place);
      if (draw.chance(7)) continue;
      readings.push({
        quantity,
        value: decimal(draw.oneOf([min + 1, min + 1, max, min, min - 1, max + 1]), 1),
        unit: UNITS[quantity]!,
        at: {
          ...(trial === undefined ? {} : { trial }),
          ...(laboratory === undefined ? {} : { laboratory }),
          specimen: String(place + 1),
        },
        origin: 'measured',
        ...(draw.chance(5) ? { qualifier: '>' as const } : {}),
      });
    }
  }
  return { where, readings };
}

const UNITS: Record<string, string> = { 'overlay-cycles': 'cycles', permeability: '10⁻⁵ cm/s' };
