import type { At, Wanted } from './conditions';
import { type Draw, decimal } from './draw';
import type { Scale } from './limits';
import type { DoubtInput, ReadingInput } from './parts';
import { type Candidate, REPLICATED } from './quantities';

export interface Shape {
  candidate: Candidate;
  wanted: Wanted;
  count: number;
  scale: Scale;
  statistic: string;
  /** Limits of a range or a deviation, in the steps of the scale. */
  spread?: number[];
}

interface Drawn {
  readings: ReadingInput[];
  doubts: DoubtInput[];
}

/** Readings around the limit: at it, half a step from it, near and far; none, censored, in words, in another unit. */
export function drawReadings(draw: Draw, shape: Shape): Drawn {
  const { candidate, wanted, count } = shape;
  const drawn: Drawn = { readings: [...wanted.beside], doubts: [] };
  const isMissing = draw.chance(9);
  const isLabelled = draw.chance(92) || count > 1;
  const centre = draw.whole(0, 1);
  const spread = drawSpread(draw, shape);
  for (let place = 0; place < count && !isMissing; place += 1) {
    const at: At = {
      ...(draw.chance(70) && candidate.isOfAggregate !== true ? { trial: 'design' } : {}),
      ...wanted.readings(place),
      ...(isLabelled ? { specimen: String(place + 1) } : {}),
    };
    const reading = drawReading(draw, shape, at, centre);
    drawn.readings.push(
      spread === null || reading.value === null ? reading : { ...reading, value: spread(place) },
    );
  }
  const [first] = drawn.readings.filter(({ quantity }) => quantity === candidate.id);
  if (first !== undefined && draw.chance(5)) drawn.readings.push(again(draw, first));
  if (draw.chance(9)) drawn.doubts.push(drawDoubt(draw, shape));
  return drawn;
}

/**
 * Values whose range or deviation is a limit, and values that are all the same. In binary arithmetic they are a hair
 * off.
 */
function drawSpread(
  draw: Draw,
  { statistic, scale, count, spread = [] }: Shape,
): ((place: number) => number) | null {
  if (!(REPLICATED as readonly string[]).includes(statistic) || !draw.chance(75)) return null;
  const { min, max, decimals } = scale;
  const start = draw.oneOf([min, max, min + 1]);
  const whole = spread.length > 0 && draw.chance(70) ? draw.oneOf(spread) : draw.whole(0, 8);
  if (statistic === 'range') return (place) => decimal(start + (place === count - 1 ? whole : 0), decimals);
  return (place) => decimal(start + place * whole, decimals);
}

/** The same specimen once more, the same number or another, or a mean beside its specimens. */
function again(draw: Draw, first: ReadingInput): ReadingInput {
  const value = draw.chance(50) ? first.value : (first.value ?? 0) + 1;
  if (!draw.chance(30)) return { ...first, value };
  const { specimen: _specimen, ...at } = first.at ?? {};
  return { ...first, at, value };
}

export function drawReading(draw: Draw, shape: Shape, at: At, centre: number): ReadingInput {
  const { candidate } = shape;
  const reading: ReadingInput = {
    quantity: candidate.id,
    value: drawValue(draw, shape.scale, centre),
    unit: candidate.unit,
    at,
    origin: 'measured',
    source: { sheet: 'Tests', cell: 'E9', text: '' },
  };
  const how = draw.weighed([
    [84, 'plain'],
    [7, 'censored'],
    [2, 'a word'],
    [4, 'another unit'],
    [2, 'a wrong unit'],
  ] as const);
  if (how === 'censored') return { ...reading, qualifier: draw.oneOf(['<', '>'] as const) };
  if (how === 'a word') return { ...reading, value: null, qualifier: 'none' };
  if (how === 'another unit') return inAnotherUnit(draw, reading, candidate);
  return how === 'a wrong unit' ? { ...reading, unit: candidate.wrong } : reading;
}

/** At the limit, on a tie between two rounded values, near, or anywhere. */
export function drawValue(draw: Draw, { min, max, decimals }: Scale, centre: number): number {
  const end = centre === 0 ? min : max;
  const how = draw.weighed([
    [20, 'at the limit'],
    [20, 'on a tie'],
    [25, 'inside'],
    [25, 'near'],
    [10, 'far'],
  ] as const);
  if (how === 'at the limit') return decimal(end, decimals);
  if (how === 'on a tie') return decimal(end * 10 + draw.oneOf([5, -5, 15, -15]), decimals + 1);
  if (how === 'inside') return decimal(draw.whole(min * 10, max * 10), decimals + 1);
  if (how === 'near') return decimal(end * 100 + draw.whole(-130, 130), decimals + 2);
  return decimal(end + draw.whole(-20, 20), decimals);
}

/** The value as it stands where the other unit only moves the point, a whole one else. */
function inAnotherUnit(draw: Draw, reading: ReadingInput, { others, unit }: Candidate): ReadingInput {
  if (others.length === 0) return reading;
  const other = draw.oneOf(others);
  const shift = SHIFTS[`${unit} ${other}`];
  const value = reading.value ?? 0;
  if (shift !== undefined) return { ...reading, unit: other, value: Number(`${value}e${shift}`) };
  const whole = Math.round(value * (ROUGHLY[`${unit} ${other}`] ?? 1) + (other === '°F' ? 32 : 0));
  return { ...reading, unit: other, value: whole };
}

/** By how many places the point moves. */
const SHIFTS: Record<string, number> = { 'kN N': 3, 'mm cm': -1, 'kPa MPa': -3, 'MPa GPa': -3 };

const ROUGHLY: Record<string, number> = {
  'kN lbf': 224.8,
  'mm in': 0.0394,
  'kPa psi': 0.145,
  'MPa psi': 145,
  '°C °F': 1.8,
};

/** A cell in doubt, about a specimen that is read as well or not, with answers that may matter or not. */
function drawDoubt(draw: Draw, shape: Shape): DoubtInput {
  const { candidate, wanted, count } = shape;
  const at: At = {
    trial: 'design',
    ...wanted.readings(0),
    ...(draw.chance(70) ? { specimen: String(draw.whole(1, count + 1)) } : {}),
  };
  const answers = Array.from({ length: draw.whole(0, 2) }, (_, i) => ({
    answer: String(i),
    label: String(i),
    reading: {
      quantity: candidate.id,
      value: drawValue(draw, shape.scale, 0),
      unit: candidate.unit,
      at,
      origin: 'measured' as const,
    },
  }));
  return {
    sheet: 'Tests',
    cell: 'E12',
    text: '14,0',
    reason: 'A comma may be a point.',
    alternatives: answers,
    about: { quantity: candidate.id, at },
  };
}
