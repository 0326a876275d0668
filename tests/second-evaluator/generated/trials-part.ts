import type { RuleInput } from '#rules/rule-sets/schema';
import { type Draw, decimal } from './draw';
import { drawLimit, drawRounding } from './limits';
import { emptyPart, type Part, type ReadingInput } from './parts';

type At = NonNullable<ReadingInput['at']>;

const CONTENTS = [4.5, 5, 5.5, 6, 6.5];
const NAMES = ['A', 'B', 'C', 'D', 'E'];

/**
 * Air voids of a design that was made itself, stands for a trial at nearly its binder content, lies between trials or
 * beyond them, or is only reported; the trials lack a gravity or a content now and then.
 */
export function trialsPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  part.designPoint = { targetAirVoids: 4, fit: draw.oneOf(['quadratic', 'quadratic', 'linear'] as const) };
  const scale = { decimals: 1, min: draw.whole(28, 40), max: 0, unit: '%' };
  scale.max = scale.min + draw.whole(5, 20);
  const limit = drawLimit(draw, `${id}-limits`, scale, false);
  const rounding = drawRounding(draw, id, scale, true);
  part.tables.push(...limit.tables, ...rounding.tables);
  const statistic = draw.weighed([
    [110, 'mean'],
    [8, 'each'],
    [8, 'range'],
    [8, 'max'],
    [8, 'standard-deviation'],
    [8, 'count'],
  ] as const);
  const isCount = statistic === 'count';
  const counted: RuleInput['limit'] = { min: 2 };
  part.rules.push({
    id,
    clause: '8',
    title: 'Air voids of the design',
    severity: 'required',
    measure: {
      kind: 'reading',
      quantity: 'air-voids',
      statistic,
      ...(draw.chance(40) ? { at: { trial: 'design' } } : {}),
      ...(draw.chance(30) ? { minimumCount: draw.whole(1, 3) } : {}),
      ...(statistic === 'mean' && draw.chance(15) ? { alsoEach: { min: '1.0', max: '8.0' } } : {}),
    },
    limit: isCount ? counted : limit.limit,
    ...(!isCount && 'rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(25) ? { precision: { value: decimal(draw.whole(0, 4), 1) } } : {}),
  });
  if (draw.chance(6)) return part;
  if (draw.chance(12)) addReported(draw, part, scale.min);
  else addTrials(draw, part, scale);
  if (draw.chance(35)) addTested(draw, part, scale.min);
  return part;
}

/**
 * Specimens that were tested for rutting: their label is one of the design's or a trial's, or they have volumetric
 * readings of their own at other voids, which may say for which test they were made.
 */
function addTested(draw: Draw, part: Part, centre: number): void {
  const at = {
    trial: draw.oneOf(['design', 'design', 'B', 'C']),
    specimen: draw.oneOf(['1', 'W1', 'W1', 'W2']),
  };
  part.readings.push(reading('loaded-wheel-rut-depth', 4, 'mm', { ...at, temperature: 64 }));
  if (!at.specimen.startsWith('W')) return;
  const form = draw.chance(30) ? { variant: 'wheel tracking' } : {};
  const hundredths = draw.oneOf([700, 700, centre * 10]);
  const isReported = part.readings.some(({ quantity }) => quantity === 'air-voids');
  if (isReported && at.trial === 'design') {
    const voids = reading('air-voids', decimal(hundredths, 2), '%', { ...at, ...form });
    part.readings.push({ ...voids, origin: 'reported' });
  } else if (!isReported) {
    const gravity = decimal(250_000 - 25 * hundredths, 5);
    part.readings.push(reading('bulk-specific-gravity-mix', gravity, '1', { ...at, ...form }));
  }
}

function addReported(draw: Draw, part: Part, centre: number): void {
  const specimens: At[] = draw.oneOf([[{}], [{ specimen: '1' }, { specimen: '2' }]]);
  for (const at of specimens) {
    const value = decimal(centre * 10 + draw.oneOf([0, 5, -5, 10, -10]), 2);
    part.readings.push({
      quantity: 'air-voids',
      value,
      unit: '%',
      at: { trial: 'design', ...at },
      origin: 'reported',
    });
  }
}

function addTrials(draw: Draw, part: Part, { min, max }: { min: number; max: number }): void {
  const count = draw.weighed([
    [40, 5],
    [25, 4],
    [20, 3],
    [10, 2],
    [5, 1],
  ]);
  const content = draw.weighed<number | null>([
    [40, 5.25],
    [40, 5.2],
    [12, 5],
    [8, 5.03],
    [8, 5.05],
    [8, 4.95],
    [8, 5.06],
    [8, 7],
    [8, 4.4],
    [8, null],
  ]);
  if (content !== null) part.readings.push(reading('binder-content', content, '%', { trial: 'design' }));
  // Air voids fall with binder; somewhere between the trials they meet a limit.
  const centre = draw.oneOf([min, max, min + 2]);
  const slope = draw.whole(6, 12);
  for (let i = 0; i < count; i += 1) {
    const trial = { trial: NAMES[i]! };
    if (!draw.chance(4)) part.readings.push(reading('binder-content', CONTENTS[i]!, '%', trial));
    addGravities(draw, part, trial, centre * 10 + (1 - i) * slope * 5 + draw.oneOf([0, 0, 5, -5, 1]));
  }
  if (draw.chance(12)) addGravities(draw, part, { trial: 'design' }, centre * 10 + draw.oneOf([0, 5, -5]));
}

/** Gravities that give air voids of so many hundredths of a percent: with Gmm 2.5 exactly. */
function addGravities(draw: Draw, part: Part, trial: At, hundredths: number): void {
  const gmm = draw.chance(70) ? 25_000 : 24_870;
  if (!draw.chance(4)) {
    part.readings.push(reading('maximum-specific-gravity', decimal(gmm, 4), '1', trial));
  }
  if (draw.chance(4)) return;
  const specimens: At[] = draw.weighed([
    [50, [{ specimen: '1' }, { specimen: '2' }]],
    [25, [{ specimen: '1' }]],
    [15, [{ specimen: '1' }, { specimen: '2' }, { specimen: '3' }]],
    [10, [{}]],
  ]);
  specimens.forEach((specimen, i) => {
    // 0.25 of a thousandth is a hundredth of a percent of 2.5.
    const steps = 250_000 - 25 * hundredths + [0, 50, -50][i]!;
    const gravity = decimal(gmm === 25_000 ? steps : Math.round((steps * 2.487) / 25) * 10, 5);
    part.readings.push(reading('bulk-specific-gravity-mix', gravity, '1', { ...trial, ...specimen }));
  });
}

function reading(quantity: string, value: number, unit: string, at: At): ReadingInput {
  return { quantity, value, unit, at, origin: 'measured' };
}
