import type { RuleInput } from '#rules/rule-sets/schema';
import { creepCurvePart } from './creep-curve-part';
import { type Draw, decimal } from './draw';
import { drawLimit, drawRounding } from './limits';
import { emptyPart, type Part, type ReadingInput } from './parts';
import { CANDIDATES } from './quantities';
import { drawWhere } from './where';

type CreepInput = Extract<RuleInput['measure'], { kind: 'creep-compliance' }>;
type At = NonNullable<ReadingInput['at']>;

const TIMES = [1, 10, 100, 1000];
const STRESS = 200;

/**
 * Compliance at four loading times: as stated or as strain under stress, with scatter and judged at a tested time, or
 * on one power law exactly and judged between the tested times or beyond them.
 */
export function creepPart(draw: Draw, id: string): Part {
  if (draw.chance(20)) return creepCurvePart(draw, id);
  const part = emptyPart();
  const isCurve = draw.chance(35);
  const measure = isCurve ? onCurve(draw) : atTested(draw);
  const scale = { decimals: draw.whole(1, 2), min: 0, max: 0, unit: '1/GPa' };
  const power = 10 ** scale.decimals;
  scale.min = draw.whole(1, 4) * (power / 10);
  scale.max = scale.min + draw.whole(1, power / 2);
  const limit = drawLimit(draw, `${id}-limits`, scale, false);
  const rounding = drawRounding(draw, id, scale, true);
  part.tables.push(...limit.tables, ...rounding.tables);
  const wanted = { rule: {}, readings: () => ({}), beside: [] };
  const met = drawWhere(draw, CANDIDATES[0]!, wanted, 3);
  part.readings.push(...met.readings);
  part.rules.push({
    id,
    clause: '7',
    title: 'Creep compliance',
    severity: 'required',
    measure: met.where.length > 0 ? { ...measure, where: met.where } : measure,
    limit: limit.limit,
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(30) ? { precision: { value: decimal(draw.whole(0, 4), scale.decimals) } } : {}),
  });
  if (!draw.chance(6)) {
    const isStrict = measure.source === 'measured';
    const hasStress = met.where.length > 0;
    addTests(draw, part, { isCurve, isStrict, hasStress, centre: scale.min, decimals: scale.decimals });
  }
  return part;
}

function onCurve(draw: Draw): CreepInput {
  return {
    kind: 'creep-compliance',
    temperature: -10,
    time: draw.oneOf([20, 5, 300, 100, 3000, 1005, 10_000, 0.1, 0.5, 20_000]),
    source: draw.oneOf(['either', 'fitted'] as const),
    model: 'power',
    ...(draw.chance(50) ? { extrapolationDecades: draw.oneOf([1, 0.4, 2]), use: 'estimate' as const } : {}),
  };
}

function atTested(draw: Draw): CreepInput {
  const isStrict = draw.chance(60);
  return {
    kind: 'creep-compliance',
    temperature: draw.oneOf([-10, -10, -10.25]),
    time: draw.oneOf(isStrict ? [100, 10, 99] : [100, 10, 101]),
    source: isStrict ? 'measured' : 'either',
    ...(draw.chance(30) ? { stress: STRESS } : {}),
  };
}

interface Tests {
  isCurve: boolean;
  /** Only measured values count, so that one time may be left out. */
  isStrict: boolean;
  /** Strain without a stress belongs to no specimen that a condition could leave out. */
  hasStress: boolean;
  /** A limit in steps, near which values lie. */
  centre: number;
  decimals: number;
}

function addTests(draw: Draw, part: Part, { isCurve, isStrict, hasStress, centre, decimals }: Tests): void {
  const isStrain = draw.chance(40);
  const curve = {
    start: draw.whole(5, 20) / 100,
    slope: draw.whole(2, 9) / 100,
    power: draw.whole(30, 60) / 100,
  };
  const test = draw.weighed<At>([
    [80, { temperature: -10 }],
    [6, { temperature: -9.5 }],
    [7, { temperature: 0 }],
    [7, {}],
  ]);
  const isOfTemperature = test.temperature === -10;
  const stress = draw.weighed<At>([
    [80, { stress: STRESS }],
    [10, { stress: 400 }],
    [hasStress ? 0 : 10, {}],
  ]);
  const lacksTime = isOfTemperature && stress.stress === STRESS && draw.chance(6);
  const skipped = isStrict ? draw.whole(0, 12) : -1;
  const specimens = draw.whole(1, 3);
  for (let specimen = 1; specimen <= specimens; specimen += 1) {
    TIMES.forEach((time, i) => {
      if (i === skipped || (lacksTime && i > 0)) return;
      const onCurve = curve.start + curve.slope * time ** curve.power;
      const stepped = decimal(centre * 10 + draw.oneOf([0, 0, 5, -5, 3, -7, 20, -2]), decimals + 1);
      const compliance = isCurve ? Number(onCurve.toPrecision(12)) : Math.max(0.01, stepped);
      const at = {
        trial: 'design',
        ...test,
        ...stress,
        ...(lacksTime ? {} : { time }),
        specimen: String(specimen),
      };
      part.readings.push(drawPoint(draw, at, compliance, isStrain, isCurve));
    });
  }
  if (draw.chance(10)) addDoubt(draw, part, { ...test, ...stress }, isStrain);
}

function drawPoint(
  draw: Draw,
  at: At,
  compliance: number,
  isStrain: boolean,
  isCurve: boolean,
): ReadingInput {
  const how = draw.weighed([
    [isCurve ? 100 : 95, 'plain'],
    [3, 'censored'],
    [1, 'another unit'],
    [1, 'a wrong unit'],
  ] as const);
  const quantity = isStrain ? 'creep-strain' : 'creep-compliance';
  const value = isStrain ? Number((compliance * STRESS).toPrecision(12)) : compliance;
  const unit = isStrain ? 'µε' : '1/GPa';
  const reading: ReadingInput = { quantity, value, unit, at, origin: 'measured' };
  if (how === 'censored' && !isStrain) return { ...reading, qualifier: draw.oneOf(['<', '>'] as const) };
  if (how === 'another unit' && !isStrain) return { ...reading, value: Number(`${value}e-3`), unit: '1/MPa' };
  return how === 'a wrong unit' ? { ...reading, unit: 'kPa' } : reading;
}

function addDoubt(draw: Draw, part: Part, test: At, isStrain: boolean): void {
  const specimen = draw.chance(50) ? { specimen: String(draw.whole(1, 4)) } : {};
  part.doubts.push({
    sheet: 'Creep',
    cell: 'D8',
    text: '?',
    reason: 'The cell cannot be read.',
    alternatives: [],
    about: {
      quantity: isStrain ? 'creep-strain' : 'creep-compliance',
      at: { trial: 'design', ...test, time: draw.oneOf(TIMES), ...specimen },
    },
  });
}
