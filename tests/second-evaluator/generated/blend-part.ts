import { asNumber, exact, over, plus, times, total } from '../own/exact';
import { type Draw, decimal } from './draw';
import { drawLimit, drawRounding } from './limits';
import { emptyPart, type Part, type ReadingInput } from './parts';

const NAMES = ['Coarse', 'Fine', 'Sand'];
const SIEVES = [4.75, 0.6];

interface Blend {
  shares: number[];
  readings: ReadingInput[];
}

/** Shares that sum to 100, nearly or not, with a stockpile that is not used now and then. */
function drawBlend(draw: Draw): Blend {
  const first = draw.whole(30, 60);
  const third = draw.oneOf([0, 10, 20]);
  const off = draw.weighed([
    [84, 0],
    [8, 0.1],
    [8, 1],
  ]);
  const shares = [first, third, 100 - first - third].map((share, i) => (i === 2 ? share + off : share));
  const readings = shares.map((value, i) => of('stockpile-share', value, { stockpile: NAMES[i]! }));
  return { shares, readings: draw.chance(5) ? readings.slice(1) : readings };
}

/** A property of the blend that follows from those of its stockpiles: by volume, or by mass. */
export function blendPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const isGravity = draw.chance(50);
  const quantity = isGravity ? 'bulk-specific-gravity-aggregate' : 'water-absorption';
  const unit = isGravity ? '1' : '%';
  const decimals = isGravity ? 3 : 2;
  const centre = isGravity ? draw.whole(2600, 2700) : draw.whole(80, 160);
  const { shares, readings } = drawBlend(draw);
  part.readings.push(...readings);
  const values = NAMES.map(() => decimal(centre + draw.whole(-20, 20), decimals));
  NAMES.forEach((stockpile, i) => {
    if (draw.chance(6)) return;
    part.readings.push({ ...of(quantity, values[i]!, { stockpile }), unit });
  });
  const blend = isGravity ? harmonic(shares, values) : arithmetic(shares, values);
  const steps = Math.round(blend * 10 ** decimals);
  const how = draw.weighed([
    [70, 'not stated'],
    [15, 'stated'],
    [15, 'stated otherwise'],
  ] as const);
  if (how === 'stated') part.readings.push({ ...of(quantity, decimal(steps, decimals), {}), unit });
  if (how === 'stated otherwise') {
    const other = decimal(steps * 100 + draw.oneOf([1, -1]) * 1371, decimals + 2);
    part.readings.push({ ...of(quantity, other, {}), unit });
  }
  const near = steps + draw.oneOf([0, 0, 1, -1, 5, -5, 20, -20]);
  const scale = { decimals, min: near - draw.whole(0, 30), max: near, unit };
  const limit = drawLimit(draw, `${id}-limits`, scale, false);
  const rounding = drawRounding(draw, id, scale, true);
  part.tables.push(...limit.tables, ...rounding.tables);
  part.rules.push({
    id,
    clause: '9',
    title: 'A property of the blend',
    severity: 'required',
    measure: {
      kind: 'reading',
      quantity,
      statistic: draw.oneOf(['mean', 'mean', 'each', 'max', 'range'] as const),
    },
    limit: limit.limit,
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
  });
  return part;
}

/** The stated gradation of the blend against the one that its stockpiles give, sieve by sieve. */
export function blendGradationPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const { shares, readings } = drawBlend(draw);
  part.readings.push(...readings);
  const max = draw.whole(1, 4);
  SIEVES.forEach((sieve, i) => {
    const values = NAMES.map((_, at) => draw.whole(10, 40) + 30 * (1 - i) + at);
    NAMES.forEach((stockpile, at) => {
      if (draw.chance(5)) return;
      part.readings.push(of('percent-passing', values[at]!, { stockpile, sieve }));
    });
    if (i > 0 && draw.chance(15)) return;
    const sum = total(shares.map((share, at) => times(exact(share), exact(values[at]!))));
    const tenths = Math.round(asNumber(sum) / 10);
    const apart = draw.oneOf([0, 10 * max, -10 * max, 10 * max + 1, 10 * max + 20, 3]);
    const trial = draw.chance(70) ? { trial: 'design' } : {};
    part.readings.push(of('percent-passing', decimal(tenths + apart, 1), { ...trial, sieve }));
  });
  const rounding = drawRounding(draw, id, { decimals: 0, min: 0, max, unit: '%' }, true);
  part.tables.push(...rounding.tables);
  part.rules.push({
    id,
    clause: '9',
    title: 'Stated and computed gradation',
    severity: 'required',
    measure: { kind: 'difference', quantity: 'percent-passing', between: ['reported', 'recomputed'] },
    limit: { max },
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
  });
  return part;
}

function harmonic(shares: number[], values: number[]): number {
  const volumes = shares.map((share, i) => over(exact(share), exact(values[i]!)));
  return asNumber(over(shares.map((share) => exact(share)).reduce(plus), total(volumes)));
}

function arithmetic(shares: number[], values: number[]): number {
  const masses = shares.map((share, i) => times(exact(share), exact(values[i]!)));
  return asNumber(over(total(masses), shares.map((share) => exact(share)).reduce(plus)));
}

function of(quantity: string, value: number, at: NonNullable<ReadingInput['at']>): ReadingInput {
  return { quantity, value, unit: '%', at, origin: 'measured' };
}
