import type { RuleInput } from '#rules/rule-sets/schema';
import { SIZES } from './attributes';
import { type Draw, decimal, written } from './draw';
import type { BoundInput, ReadingInput, TableInput } from './parts';

/** Where numbers of a quantity lie, in steps of the decimals that its limit has. */
export interface Scale {
  decimals: number;
  /** The limit's own steps, `140` for 14.0. */
  min: number;
  max: number;
  unit: string;
}

export interface DrawnLimit {
  limit: RuleInput['limit'];
  tables: TableInput[];
  readings: ReadingInput[];
}

/** A limit of any form around min and max, with the tables and readings that it rests on. */
export function drawLimit(draw: Draw, id: string, scale: Scale, canRefer: boolean): DrawnLimit {
  const form = draw.weighed([
    [24, 'min'],
    [24, 'max'],
    [14, 'both'],
    [12, 'target'],
    [18, 'table'],
    [canRefer ? 20 : 0, 'quantity'],
  ] as const);
  if (form === 'table') return fromTable(draw, id, scale);
  if (form === 'quantity') return fromQuantity(draw, scale);
  const bound = (steps: number): BoundInput => drawNumber(draw, steps, scale.decimals);
  const none = { tables: [], readings: [] };
  if (form === 'target') {
    const half = Math.max(1, Math.floor((scale.max - scale.min) / 2));
    const target = scale.min + half;
    const limit = { target: plainNumber(draw, target, scale), tolerance: plainNumber(draw, half, scale) };
    return { ...none, limit: draw.chance(15) ? { ...limit, exclusive: true } : limit };
  }
  const limit: RuleInput['limit'] = {
    ...(form === 'max' ? {} : { min: bound(scale.min) }),
    ...(form === 'min' ? {} : { max: bound(scale.max) }),
  };
  return { ...none, limit: draw.chance(15) ? { ...limit, exclusive: true } : limit };
}

function plainNumber(draw: Draw, steps: number, { decimals }: Scale): number | string {
  return draw.chance(50) ? written(steps, decimals) : decimal(steps, decimals);
}

function drawNumber(draw: Draw, steps: number, decimals: number): BoundInput {
  const value = draw.chance(60) ? written(steps, decimals) : decimal(steps, decimals);
  return draw.chance(15) ? { value, exclusive: draw.chance(70) } : value;
}

/** Keyed by size as it stands or by ranges, by traffic, or by both; now and then without a row or a cell. */
function fromTable(draw: Draw, id: string, scale: Scale): DrawnLimit {
  const rows: TableInput['rows'] = [];
  const keys = draw.oneOf([['nominalMaximumSize'], ['designTraffic'], ['nominalMaximumSize', 'course']]);
  for (const cells of keyCells(draw, keys)) {
    if (draw.chance(6)) continue;
    const shift = draw.whole(0, 2);
    const isOpen = draw.chance(8);
    rows.push({
      ...cells,
      min: isOpen ? null : written(scale.min + shift, scale.decimals),
      max: written(scale.max + shift, scale.decimals),
    });
  }
  const unit = draw.chance(50) ? { unit: scale.unit } : {};
  const table = {
    id,
    keys,
    columns: [
      { name: 'min', ...unit },
      { name: 'max', ...unit },
    ],
    rows,
  };
  const ends = draw.oneOf([['min'], ['max'], ['min', 'max']] as const);
  const limit: RuleInput['limit'] = {};
  for (const end of ends) {
    limit[end] = { table: id, column: end, ...(draw.chance(20) ? { exclusive: true } : {}) };
  }
  return { limit, tables: [table], readings: [] };
}

function keyCells(draw: Draw, keys: string[]): TableInput['rows'] {
  if (keys[0] === 'designTraffic') {
    return [
      { designTraffic: { below: 3 } },
      { designTraffic: { from: 3, below: 10 } },
      { designTraffic: draw.chance(50) ? { from: 10 } : { from: 10, below: 30 } },
    ];
  }
  const sizes: TableInput['rows'] = draw.chance(40)
    ? [{ nominalMaximumSize: { below: 12.5 } }, { nominalMaximumSize: { from: 12.5, below: 25 } }]
    : SIZES.map((size) => ({ nominalMaximumSize: draw.chance(20) ? String(size) : size }));
  if (keys.length === 1) return sizes;
  return sizes.flatMap((cells) => ['Surface', 'base', 'binder'].map((course) => ({ ...cells, course })));
}

/** As far from another quantity of the same mix as `plus` says. */
function fromQuantity(draw: Draw, scale: Scale): DrawnLimit {
  const end = draw.oneOf(['min', 'max'] as const);
  const plus = draw.whole(-3, 3);
  const steps = (end === 'min' ? scale.min : scale.max) - plus;
  const readings: ReadingInput[] = [];
  if (!draw.chance(18)) {
    const qualifier = draw.chance(8) ? { qualifier: '>' as const } : {};
    readings.push({
      quantity: REFERRED,
      value: decimal(steps, scale.decimals),
      unit: '%',
      at: { trial: 'design' },
      origin: 'measured',
      ...qualifier,
    });
  }
  const bound = {
    quantity: REFERRED,
    plus: draw.chance(50) ? written(plus, scale.decimals) : decimal(plus, scale.decimals),
    ...(draw.chance(20) ? { exclusive: true } : {}),
  };
  return { limit: { [end]: bound }, tables: [], readings };
}

/** Only limits refer to it. */
export const REFERRED = 'fibre-content';

export function drawRounding(draw: Draw, id: string, scale: Scale, mayBeOfLimit: boolean) {
  const tables: TableInput[] = [];
  const method = draw.weighed([
    [30, 'rounding'],
    [14, 'half-up'],
    [14, 'truncate'],
    [14, 'absolute'],
    [12, 'absent'],
    [10, 'of a table'],
  ] as const);
  if (method === 'absent') return { tables };
  if (method === 'of a table') {
    const columns = [{ name: 'step' }];
    const rows = SIZES.filter(() => !draw.chance(5)).map((nominalMaximumSize) => ({
      nominalMaximumSize,
      step: draw.oneOf(['1', '0.1', '0.5', '0.05']),
    }));
    tables.push({ id: `${id}-steps`, keys: ['nominalMaximumSize'], columns, rows });
    return {
      tables,
      rounding: { method: 'rounding' as const, to: { table: `${id}-steps`, column: 'step' } },
    };
  }
  const step = decimal(1, scale.decimals);
  const to = draw.weighed<number | string>([
    [40, step],
    [20, String(decimal(5, scale.decimals))],
    [15, 5 * step],
    [mayBeOfLimit ? 25 : 0, 'limit'],
  ] as const);
  return { tables, rounding: { method, to } };
}
