import type { RuleInput } from '#rules/rule-sets/schema';
import { drawConditions } from './conditions';
import { type Draw, decimal, written } from './draw';
import { drawLimit, drawRounding, type Scale } from './limits';
import { type BoundInput, emptyPart, type Part } from './parts';
import { type Candidate, measuredAt, REPLICATED } from './quantities';
import { drawReadings, type Shape } from './readings';
import { drawWhere } from './where';

type Statistic = NonNullable<Extract<RuleInput['measure'], { kind: 'reading' }>['statistic']>;

/** A rule on readings, with readings that its statistic, conditions and limit make hard. */
export function readingPart(draw: Draw, id: string, candidate: Candidate): Part {
  const part = emptyPart();
  const scale = measuredAt(draw, candidate);
  const statistic = draw.weighed<Statistic>([
    [30, 'mean'],
    [12, 'each'],
    [6, 'min'],
    [6, 'max'],
    [8, 'range'],
    [8, 'standard-deviation'],
    [8, 'trimmed-mean'],
    [7, 'count'],
    [9, 'percent-within-limits'],
  ]);
  const judgedScale = scaleOfStatistic(draw, statistic, scale);
  const isPresent = draw.chance(5);
  const wanted = drawConditions(draw, candidate);
  const limit = drawLimit(draw, `${id}-limits`, judgedScale, candidate.unit === '%' && statistic === 'mean');
  const rounding = drawRounding(draw, id, judgedScale, !refers(limit.limit.min) && !refers(limit.limit.max));
  const count = draw.whole(1, 4) + (NEEDS_MORE.has(statistic) ? 1 : 0);
  const where = drawWhere(draw, candidate, wanted, count);
  part.tables.push(...limit.tables, ...rounding.tables);
  part.readings.push(...limit.readings, ...where.readings);
  const isSpread = statistic === 'range' || statistic === 'standard-deviation';
  const spread = isSpread ? [judgedScale.min, judgedScale.max] : [];
  const shape: Shape = { candidate, wanted, count, scale, statistic, spread };
  const drawn = drawReadings(draw, shape);
  part.readings.push(...drawn.readings);
  part.doubts.push(...drawn.doubts);
  part.rules.push({
    id,
    clause: '1',
    title: candidate.id,
    severity: draw.oneOf(['required', 'advisory'] as const),
    measure: {
      kind: 'reading',
      quantity: candidate.id,
      at: wanted.rule,
      statistic,
      ...(statistic === 'percent-within-limits' ? { within: withinOf(draw, scale) } : {}),
      ...(draw.chance(25) ? { minimumCount: draw.whole(1, 4) } : {}),
      ...(statistic === 'mean' && draw.chance(25) ? { alsoEach: singles(draw, scale) } : {}),
      ...(where.where.length > 0 ? { where: where.where } : {}),
    },
    limit: isPresent ? { present: true } : limit.limit,
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(35) ? { precision: precisionOf(draw, judgedScale) } : {}),
  });
  return part;
}

const NEEDS_MORE = new Set<Statistic>(REPLICATED);

function refers(bound: BoundInput): boolean {
  return typeof bound === 'object' && 'quantity' in bound;
}

function precisionOf(draw: Draw, { decimals }: Scale): { value: number | string } {
  const steps = draw.whole(0, 6);
  return { value: draw.chance(50) ? written(steps, decimals) : decimal(steps, decimals) };
}

/** Counts are whole, percentages between none and all, a spread is small. */
function scaleOfStatistic(draw: Draw, statistic: Statistic, scale: Scale): Scale {
  if (statistic === 'count') return { decimals: 0, min: draw.whole(1, 3), max: draw.whole(3, 5), unit: '1' };
  if (statistic === 'percent-within-limits') {
    return { decimals: draw.whole(0, 1), min: 60, max: draw.oneOf([90, 100]), unit: '%' };
  }
  if (statistic === 'range' || statistic === 'standard-deviation') {
    return { ...scale, min: draw.whole(0, 2), max: draw.whole(2, 8) };
  }
  return scale;
}

function withinOf(draw: Draw, { min, max, decimals }: Scale): { min?: string; max?: string } {
  const ends = { min: written(min, decimals), max: written(max, decimals) };
  return draw.weighed<{ min?: string; max?: string }>([
    [3, ends],
    [1, { min: ends.min }],
    [1, { max: ends.max }],
  ]);
}

function singles(draw: Draw, { min, max, decimals }: Scale): { min?: string; max?: string } {
  const slack = draw.whole(0, 3);
  const ends = { min: written(min - slack, decimals), max: written(max + slack, decimals) };
  return draw.oneOf([{ min: ends.min }, { max: ends.max }, ends]);
}
