import type { RuleInput } from '#rules/rule-sets/schema';
import { drawAllowed } from './attributes';
import { type Draw, decimal } from './draw';
import { drawLimit, drawRounding } from './limits';
import { type DocumentInput, emptyPart, type Part } from './parts';
import { type Candidate, measuredAt } from './quantities';
import { drawReadings } from './readings';
import { drawWhere } from './where';

/** An attribute that is stated, among allowed values from a list or a table, or a number within limits. */
export function attributePart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const { attribute, values, isNumber } = drawAllowed(draw);
  const rule = { id, clause: '3', title: attribute, severity: 'required' as const };
  const measure = { kind: 'attribute' as const, attribute };
  if (draw.chance(10)) part.rules.push({ ...rule, measure, limit: { present: true } });
  else if (isNumber && draw.chance(55)) {
    const numbers = values.map((value) => Math.round(Number(value) * 10));
    const least = draw.oneOf(numbers);
    const scale = { decimals: 1, min: least, max: least + draw.whole(0, 100), unit: '1' };
    const limit = drawLimit(draw, `${id}-limits`, scale, false);
    const rounding = drawRounding(draw, id, scale, true);
    part.tables.push(...limit.tables.map(withoutUnits), ...rounding.tables);
    part.rules.push({ ...rule, measure, limit: limit.limit, ...roundingOf(rounding) });
  } else {
    const allowed = values.filter(() => draw.chance(55));
    const list = allowed.length > 0 ? allowed : [values[0]!];
    part.rules.push({ ...rule, measure, limit: { oneOf: oneOf(draw, id, part, list) } });
  }
  return part;
}

function withoutUnits<T extends { columns: { name: string }[] }>(table: T): T {
  return { ...table, columns: table.columns.map(({ name }) => ({ name })) };
}

function oneOf(
  draw: Draw,
  id: string,
  part: Part,
  list: readonly (number | string | boolean)[],
): NonNullable<RuleInput['limit']['oneOf']> {
  if (!draw.chance(35)) return [...list];
  const cell = list.map(String);
  part.tables.push({
    id: `${id}-allowed`,
    keys: ['designTraffic'],
    columns: [{ name: 'allowed' }],
    rows: [
      { designTraffic: { below: 10 }, allowed: cell.length === 1 ? cell[0]! : cell },
      { designTraffic: { from: 10, below: 30 }, allowed: draw.chance(30) ? null : cell },
    ],
  });
  return { table: `${id}-allowed`, column: 'allowed' };
}

const DAYS = [
  '2026-02-09',
  '2025-01-31',
  '2025-02-28',
  '2025-08-31',
  '2026-01-28',
  '2026-02-28',
  '2026-03-09',
  '2026-03-10',
];

/** A document, stated or enclosed, of an age that just holds or just does not, with or without a date. */
export function documentPart(draw: Draw, id: string, type: string): Part {
  const part = emptyPart();
  const enclosed = draw.chance(30);
  const count = draw.weighed([
    [12, 0],
    [60, 1],
    [28, 2],
  ]);
  for (let i = 0; i < count; i += 1) part.documents.push(drawDocument(draw, type));
  if (draw.chance(10)) {
    part.doubts.push({
      sheet: 'Documents',
      cell: 'B7',
      text: '2/3/26',
      reason: 'Day and month cannot be told apart.',
      alternatives: draw.chance(50)
        ? [{ answer: '1', label: '3 February', document: { type, date: '2026-02-03' } }]
        : [],
      about: { document: type },
    });
  }
  const on = draw.weighed<'submitted' | 'letting' | string | undefined>([
    [30, undefined],
    [30, 'submitted'],
    [20, 'letting'],
    [20, '2026-02-28'],
  ]);
  part.rules.push({
    id,
    clause: '4',
    title: type,
    severity: 'required',
    measure: {
      kind: 'document',
      type,
      ...(enclosed ? { enclosed } : {}),
      ...(draw.chance(75) ? { maximumAgeMonths: draw.oneOf([1, 6, 12]) } : {}),
      ...(on === undefined ? {} : { on }),
    },
    limit: { present: true },
  });
  return part;
}

function drawDocument(draw: Draw, type: string): DocumentInput {
  return {
    type,
    date: draw.chance(12) ? null : draw.oneOf(DAYS),
    ...(draw.chance(15) ? { validTo: draw.oneOf(['2026-01-14', '2026-02-28', '2026-12-31']) } : {}),
    enclosed: draw.chance(60),
  };
}

/** Two laboratories beside each other, over any statistic. */
export function differencePart(draw: Draw, id: string, candidate: Candidate): Part {
  const part = emptyPart();
  const scale = measuredAt(draw, candidate);
  const statistic = draw.oneOf([
    'mean',
    'mean',
    'mean',
    'min',
    'max',
    'range',
    'trimmed-mean',
    'count',
  ] as const);
  const unit = statistic === 'count' ? '1' : candidate.unit;
  const apart = { ...scale, min: draw.whole(0, 1), max: draw.whole(2, 12), unit };
  const limit = drawLimit(draw, `${id}-limits`, apart, false);
  const rounding = drawRounding(draw, id, apart, true);
  part.tables.push(
    ...(statistic === 'count' ? limit.tables.map(withoutUnits) : limit.tables),
    ...rounding.tables,
  );
  const where: NonNullable<RuleInput['measure']['where']> = [];
  for (const laboratory of ['contractor', 'agency'] as const) {
    const stated = laboratory === 'agency' ? { laboratory } : {};
    const wanted = { rule: {}, readings: () => stated, beside: [] };
    const count = draw.whole(1, 4);
    const met = drawWhere(draw, candidate, wanted, count, where.length > 0);
    if (laboratory === 'contractor') where.push(...met.where);
    else if (where.length === 0) met.readings = [];
    part.readings.push(...met.readings);
    const drawn = drawReadings(draw, { candidate, wanted, count, scale, statistic });
    part.readings.push(...drawn.readings);
    part.doubts.push(...drawn.doubts);
  }
  part.rules.push({
    id,
    clause: '5',
    title: candidate.id,
    severity: 'required',
    measure: {
      kind: 'difference',
      quantity: candidate.id,
      between: ['contractor', 'agency'],
      statistic,
      ...(where.length > 0 ? { where } : {}),
    },
    limit: limit.limit,
    ...roundingOf(rounding),
    ...(draw.chance(30) ? { precision: { value: decimal(draw.whole(0, 3), scale.decimals) } } : {}),
  });
  return part;
}

/** The reported air voids against those of the gravities; at ties, because 2.5 divides evenly. */
export function recomputedPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const at = { trial: 'design' };
  const specimens = draw.whole(1, 3);
  const sure = (quantity: string, value: number, specimen?: string) => ({
    quantity,
    value,
    unit: quantity === 'air-voids' ? '%' : '1',
    at: specimen === undefined ? at : { ...at, specimen },
    origin: quantity === 'air-voids' ? ('reported' as const) : ('measured' as const),
    source: { sheet: 'Trials', cell: 'E9', text: String(value) },
  });
  if (!draw.chance(12)) part.readings.push(sure('maximum-specific-gravity', 2.5));
  for (let i = 1; i <= specimens && !draw.chance(6); i += 1) {
    part.readings.push(sure('bulk-specific-gravity-mix', decimal(draw.whole(2380, 2420), 3), String(i)));
  }
  if (!draw.chance(14)) part.readings.push(sure('air-voids', decimal(draw.whole(36, 44), 1)));
  if (draw.chance(12)) {
    const quantity = draw.oneOf(['maximum-specific-gravity', 'bulk-specific-gravity-mix', 'air-voids']);
    const about = { quantity, at };
    const cell = { sheet: 'Trials', cell: 'F9', text: '?', reason: 'The cell cannot be read.' };
    part.doubts.push({ ...cell, alternatives: [], about });
  }
  const scale = { decimals: 1, min: 0, max: draw.whole(1, 4), unit: '%' };
  const rounding = drawRounding(draw, id, scale, true);
  part.tables.push(...rounding.tables);
  part.rules.push({
    id,
    clause: '5',
    title: 'Reported air voids',
    severity: 'required',
    measure: { kind: 'difference', quantity: 'air-voids', between: ['reported', 'recomputed'] },
    limit: { max: decimal(scale.max, 1) },
    ...roundingOf(rounding),
  });
  return part;
}

function roundingOf(drawn: ReturnType<typeof drawRounding>): Pick<RuleInput, 'rounding'> {
  return 'rounding' in drawn && drawn.rounding !== undefined ? { rounding: drawn.rounding } : {};
}
