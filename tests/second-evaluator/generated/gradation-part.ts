import type { RuleInput } from '#rules/rule-sets/schema';
import { SIZES } from './attributes';
import { type Draw, decimal, written } from './draw';
import { drawRounding, type Scale } from './limits';
import { emptyPart, type Part, type TableInput } from './parts';
import { PASSING } from './quantities';
import { drawReading } from './readings';

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
  part.rules.push({
    id,
    clause: '2',
    title: 'Gradation',
    severity: 'required',
    measure: { kind: 'gradation', table: table.id, ...(draw.chance(20) ? { at: { trial: 'design' } } : {}) },
    limit: limitOf(draw, table.id),
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(30) ? { precision: { value: decimal(draw.whole(0, 3), decimals) } } : {}),
  });
  if (!draw.chance(8)) addReadings(draw, part, scales);
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

function addReadings(draw: Draw, part: Part, scales: Scale[]): void {
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
    part.readings.push(drawReading(draw, shape, { ...trial, sieve }, draw.whole(0, 1)));
  });
}
