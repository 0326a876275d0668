import type { RuleInput } from '#rules/rule-sets/schema';
import { SIZES } from './attributes';
import { type Draw, decimal, written } from './draw';
import { drawRounding, type Scale } from './limits';
import { emptyPart, type Part, type ReadingInput, type TableInput } from './parts';
import { PASSING } from './quantities';
import { drawReading } from './readings';
import { drawWhere } from './where';

const SIEVES = [19, 12.5, 4.75, 0.075];
const MIDDLES = [90, 70, 40, 5];

/** A band by sieve, for all mixes or by size, with a sieve that has no limit or no reading now and then. */
export function gradationPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const decimals = draw.whole(0, 1);
  const power = 10 ** decimals;
  const bySize = draw.chance(50);
  const scales: Scale[] = MIDDLES.map((middle) => {
    const min = middle * power - draw.whole(0, 2);
    return { decimals, min, max: min + draw.whole(1, 6), unit: '%' };
  });
  const table: TableInput = {
    id: `${id}-band`,
    keys: bySize ? ['nominalMaximumSize', 'sieve'] : ['sieve'],
    columns: [{ name: 'min', ...(draw.chance(50) ? { unit: '%' } : {}) }, { name: 'max' }],
    rows: [],
  };
  for (const size of bySize ? SIZES.filter(() => !draw.chance(8)) : [undefined]) {
    SIEVES.forEach((sieve, i) => {
      const { min, max } = scales[i]!;
      const hasNone = draw.chance(16);
      table.rows.push({
        ...(size === undefined ? {} : { nominalMaximumSize: size }),
        sieve,
        min: hasNone ? null : written(min, decimals),
        max: hasNone ? null : draw.chance(50) ? written(max, decimals) : decimal(max, decimals),
      });
    });
  }
  part.tables.push(table);
  const rounding = drawRounding(draw, id, scales[0]!, true);
  part.tables.push(...rounding.tables);
  const hasReadings = !draw.chance(8);
  const stated = draw.weighed([
    [60, 'passing'],
    [20, 'cumulative'],
    [20, 'individual'],
  ] as const);
  const wanted = { rule: {}, readings: () => ({}), beside: [] };
  const samples = stated === 'passing' && draw.chance(20) ? 2 : 0;
  const met = drawWhere(draw, { ...PASSING, isOfAggregate: undefined }, wanted, samples, samples > 0);
  part.readings.push(...met.readings);
  part.rules.push({
    id,
    clause: '2',
    title: 'Gradation',
    severity: 'required',
    measure: {
      kind: 'gradation',
      table: table.id,
      ...(draw.chance(20) ? { at: { trial: 'design' } } : {}),
      ...(met.where.length > 0 ? { where: met.where } : {}),
    },
    limit: limitOf(draw, table.id),
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(30) ? { precision: { value: decimal(draw.whole(0, 3), decimals) } } : {}),
  });
  if (hasReadings && stated === 'passing') addReadings(draw, part, scales, samples);
  if (hasReadings && stated !== 'passing') addRetained(draw, part, scales, stated);
  return part;
}

function limitOf(draw: Draw, table: string): RuleInput['limit'] {
  const exclusive = draw.chance(15) ? { exclusive: true } : {};
  const ends = { min: { table, column: 'min', ...exclusive }, max: { table, column: 'max' } };
  return draw.weighed<RuleInput['limit']>([
    [4, ends],
    [1, { min: ends.min }],
    [1, { max: ends.max }],
  ]);
}

function addReadings(draw: Draw, part: Part, scales: Scale[], samples: number): void {
  const trial = draw.weighed([
    [70, { trial: 'design' }],
    [25, {}],
    [5, { trial: 'B' }],
  ]);
  SIEVES.forEach((sieve, i) => {
    const wanted = { rule: {}, readings: () => ({ ...trial, sieve }), beside: [] };
    const shape = { candidate: PASSING, wanted, count: 1, scale: scales[i]!, statistic: 'mean' };
    const isInDoubt = draw.chance(9);
    if (isInDoubt) {
      part.doubts.push({
        sheet: 'Gradation',
        cell: `C${i + 2}`,
        text: '?',
        reason: 'The cell cannot be read.',
        alternatives: [],
        about: { quantity: PASSING.id, at: { ...trial, sieve } },
      });
    }
    if (draw.chance(isInDoubt ? 60 : 9)) return;
    const places = samples === 0 ? [{}] : [{ specimen: '1' }, { specimen: '2' }];
    for (const place of places) {
      part.readings.push(drawReading(draw, shape, { ...trial, sieve, ...place }, draw.whole(0, 1)));
    }
  });
}

/**
 * The same gradation by what stays on its sieves, each alone or with all above; a cell in doubt, censored, in another
 * unit or left out now and then, and here and there a sieve of which percent passing is stated as well.
 */
function addRetained(draw: Draw, part: Part, scales: Scale[], stated: 'cumulative' | 'individual'): void {
  const trial = draw.weighed([
    [70, { trial: 'design' }],
    [25, {}],
    [5, { trial: 'B' }],
  ]);
  const quantity = stated === 'cumulative' ? 'cumulative-percent-retained' : 'percent-retained';
  let above = 0;
  SIEVES.forEach((sieve, i) => {
    const { decimals, min, max } = scales[i]!;
    const power = 10 ** decimals;
    const retained = 100 * power - draw.oneOf([min, max, min - 1, max + 1, min, max]);
    const steps = stated === 'cumulative' ? retained : retained - above;
    above = retained;
    const how = draw.weighed([
      [80, 'stated'],
      [6, 'left out'],
      [5, 'in doubt'],
      [3, 'censored'],
      [2, 'a wrong unit'],
      [4, 'passing as well'],
    ] as const);
    const at = { ...trial, sieve };
    const reading: ReadingInput = {
      quantity,
      value: decimal(steps, decimals),
      unit: '%',
      at,
      origin: 'measured',
    };
    if (how === 'in doubt') {
      part.doubts.push({
        sheet: 'Gradation',
        cell: `D${i + 2}`,
        text: '?',
        reason: 'The cell cannot be read.',
        alternatives: [],
        about: { quantity, at },
      });
    }
    if (how === 'left out' || how === 'in doubt') return;
    if (how === 'censored') part.readings.push({ ...reading, qualifier: draw.oneOf(['<', '>'] as const) });
    else part.readings.push(how === 'a wrong unit' ? { ...reading, unit: 'mm' } : reading);
    if (how === 'passing as well') {
      part.readings.push({ ...reading, quantity: PASSING.id, value: decimal(min, decimals) });
    }
  });
}
