import { asNumber, type Exact, exact } from '../own/exact';
import { computed, NoValue } from '../own/formula';
import { type Draw, decimal, written } from './draw';
import { drawRounding } from './limits';
import { emptyPart, type Part, type ReadingInput } from './parts';
import { CANDIDATES } from './quantities';
import { drawWhere } from './where';

/** Symbols with their quantities, units and the whole numbers between which they lie. */
const SYMBOLS: Record<
  string,
  { quantity: string; unit: string; least: number; most: number; sieve?: number }
> = {
  Gmm: { quantity: 'maximum-specific-gravity', unit: '1', least: 2, most: 3 },
  MS: { quantity: 'marshall-stability', unit: 'kN', least: 6, most: 12 },
  MF: { quantity: 'marshall-flow', unit: 'mm', least: 2, most: 5 },
  DD: { quantity: 'draindown', unit: '%', least: 1, most: 3 },
  RS: { quantity: 'retained-stability', unit: '%', least: 70, most: 90 },
  SE: { quantity: 'sand-equivalent', unit: '%', least: 40, most: 50 },
  LA: { quantity: 'abrasion-loss', unit: '%', least: 25, most: 45 },
  'P4.75': { quantity: 'percent-passing', unit: '%', least: 40, most: 60, sieve: 4.75 },
  'P0.6': { quantity: 'percent-passing', unit: '%', least: 10, most: 30, sieve: 0.6 },
  'P0.075': { quantity: 'percent-passing', unit: '%', least: 2, most: 9, sieve: 0.075 },
};

const FORMULAS: { expression: string; symbols: string[]; unit?: string }[] = [
  { expression: 'RS - 2 * DD', symbols: ['RS', 'DD'], unit: '%' },
  { expression: 'MS / MF', symbols: ['MS', 'MF'], unit: 'kN/mm' },
  { expression: 'MS/MF*2 - 1', symbols: ['MS', 'MF'] },
  { expression: '100 * (P0.6 - P0.075) / (P4.75 - P0.075)', symbols: ['P0.6', 'P0.075', 'P4.75'], unit: '%' },
  { expression: 'max(SE, LA) - min(SE, LA, 44)', symbols: ['SE', 'LA'], unit: '%' },
  { expression: 'abs(DD - 2)^2 * 10', symbols: ['DD'] },
  { expression: '-DD^2 + 3', symbols: ['DD'] },
  { expression: 'sqrt(DD - 1.5) + Gmm', symbols: ['DD', 'Gmm'] },
  { expression: 'RS / (DD - 2)', symbols: ['RS', 'DD'] },
  { expression: 'ln(Gmm) + log10(MS) - MF / -2', symbols: ['Gmm', 'MS', 'MF'] },
];

/** A formula whose limit lies at, near or far from its value, with a symbol that lacks or doubts it now and then. */
export function formulaPart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const { expression, symbols, unit } = draw.oneOf(FORMULAS);
  const values = new Map<string, Exact>();
  const wanted = { rule: {}, readings: () => ({}), beside: [] };
  const met = drawWhere(draw, CANDIDATES[0]!, wanted, 2);
  part.readings.push(...met.readings);
  for (const symbol of symbols) {
    const value = drawSymbol(draw, part, symbol, met.where.length > 0);
    values.set(symbol, exact(value));
  }
  const decimals = draw.whole(0, 2);
  const steps = Math.round(valueOrOne(expression, values) * 10 ** decimals);
  const near = steps + draw.oneOf([0, 0, 1, -1, 2, -3]);
  const scale = { decimals, min: near, max: near, unit: unit ?? '1' };
  const rounding = drawRounding(draw, id, scale, true);
  part.tables.push(...rounding.tables);
  const bound = draw.chance(50)
    ? written(near, decimals)
    : { value: decimal(near, decimals), exclusive: true };
  part.rules.push({
    id,
    clause: '6',
    title: expression,
    severity: 'required',
    measure: {
      kind: 'formula',
      expression,
      ...(unit === undefined ? {} : { unit }),
      ...(draw.chance(20) ? { at: { trial: 'design' } } : {}),
      ...(met.where.length > 0 ? { where: met.where } : {}),
    },
    limit: draw.chance(50) ? { min: bound } : { max: bound },
    ...('rounding' in rounding ? { rounding: rounding.rounding } : {}),
    ...(draw.chance(30) ? { precision: { value: decimal(draw.whole(0, 4), decimals) } } : {}),
  });
  return part;
}

function valueOrOne(expression: string, values: Map<string, Exact>): number {
  try {
    return asNumber(computed(expression, (name) => values.get(name)!));
  } catch (error) {
    if (error instanceof NoValue) return 1;
    throw error;
  }
}

function drawSymbol(draw: Draw, part: Part, symbol: string, isOfSpecimens: boolean): number {
  const { quantity, unit, least, most, sieve } = SYMBOLS[symbol]!;
  const decimals = draw.whole(0, 2);
  const power = 10 ** decimals;
  const steps = draw.whole(least * power, most * power);
  const at = sieve === undefined ? {} : { sieve };
  const how = draw.weighed([
    [79, 'stated'],
    [6, 'missing'],
    [4, 'censored'],
    [3, 'in doubt'],
    [4, 'of another trial'],
    [isOfSpecimens ? 100 : 4, 'replicates'],
  ] as const);
  const reading = (value: number): ReadingInput => ({ quantity, value, unit, at, origin: 'measured' });
  if (how === 'stated') part.readings.push(reading(decimal(steps, decimals)));
  if (how === 'censored') part.readings.push({ ...reading(decimal(steps, decimals)), qualifier: '<' });
  if (how === 'of another trial') {
    part.readings.push({ ...reading(decimal(steps, decimals)), at: { ...at, trial: 'B' } });
  }
  if (how === 'in doubt') {
    const cell = { sheet: 'Tests', cell: 'E20', text: '?', reason: 'The cell cannot be read.' };
    part.doubts.push({ ...cell, alternatives: [], about: { quantity, at } });
  }
  if (how === 'replicates') {
    part.readings.push(
      { ...reading(decimal(steps - 1, decimals)), at: { ...at, specimen: '1' } },
      { ...reading(decimal(steps + 2, decimals)), at: { ...at, specimen: '2' } },
    );
  }
  return decimal(steps, decimals);
}
