import type { Draw } from './draw';
import type { Scale } from './limits';

/** A measured quantity that a rule may be drawn over, with what its workbook may state it in. */
export interface Candidate {
  id: string;
  unit: string;
  /** Whole numbers between which its limit lies. */
  least: number;
  most: number;
  /** Other units of the same kind, and one of another. */
  others: string[];
  wrong: string;
  isOfAggregate?: true | undefined;
  bySieve?: true;
}

const percent = { unit: '%', others: [], wrong: 'mm' };
const length = { unit: 'mm', others: ['in', 'cm'], wrong: 'kPa' };

export const CANDIDATES: Candidate[] = [
  { id: 'marshall-stability', unit: 'kN', least: 6, most: 12, others: ['N', 'lbf'], wrong: 'kPa' },
  { id: 'marshall-flow', least: 2, most: 5, ...length },
  { id: 'draindown', least: 1, most: 3, ...percent },
  { id: 'coating', least: 80, most: 95, ...percent },
  { id: 'mix-moisture', least: 1, most: 3, ...percent },
  { id: 'lift-thickness', least: 40, most: 60, ...length },
  { id: 'retained-stability', least: 70, most: 90, ...percent },
  { id: 'proportional-rut-depth', least: 5, most: 9, ...percent },
  { id: 'water-absorption', least: 1, most: 2, ...percent, isOfAggregate: true },
  { id: 'wheel-track-rut-depth', least: 5, most: 12, ...length },
  { id: 'loaded-wheel-rut-depth', least: 4, most: 8, ...length },
  {
    id: 'high-temperature-tensile-strength',
    unit: 'kPa',
    least: 200,
    most: 400,
    others: ['MPa', 'psi'],
    wrong: 'mm',
  },
  { id: 'dynamic-modulus', unit: 'MPa', least: 900, most: 1200, others: ['GPa', 'psi'], wrong: '%' },
  {
    id: 'softening-point',
    unit: '°C',
    least: 45,
    most: 60,
    others: ['°F'],
    wrong: 'mm',
    isOfAggregate: true,
  },
  { id: 'elastic-recovery', least: 50, most: 75, ...percent, isOfAggregate: true },
  { id: 'sand-equivalent', least: 40, most: 50, ...percent, isOfAggregate: true },
  { id: 'abrasion-loss', least: 25, most: 40, ...percent, isOfAggregate: true },
  { id: 'micro-deval-loss', least: 12, most: 18, ...percent, isOfAggregate: true },
  { id: 'flat-and-elongated', least: 5, most: 10, ...percent, isOfAggregate: true },
  { id: 'soundness-loss', least: 8, most: 15, ...percent, isOfAggregate: true },
];

export const PASSING: Candidate = {
  id: 'percent-passing',
  least: 20,
  most: 60,
  ...percent,
  isOfAggregate: true,
  bySieve: true,
};

/** Statistics that one value has none of. */
export const REPLICATED = ['range', 'standard-deviation', 'trimmed-mean', 'percent-within-limits'] as const;

/** Decimals of the limit, and its two ends in steps of them. */
export function measuredAt(draw: Draw, { least, most, unit }: Candidate): Scale {
  const decimals = draw.whole(0, 2);
  const power = 10 ** decimals;
  const min = draw.whole(least * power, most * power);
  return { decimals, min, max: min + draw.whole(1, Math.max(1, 2 * power)), unit };
}
