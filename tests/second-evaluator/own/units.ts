import { type Exact, exact, minus, over, plus, times } from './exact';

/** Of one unit in the base unit of its kind: defined factors, exact (NIST SP 811, 2008; from memory, verify). */
const FACTORS: Record<string, { kind: string; factor: Exact; offset?: Exact }> = {
  '%': { kind: '%', factor: exact(1) },
  '1': { kind: '1', factor: exact(1) },
  mm: { kind: 'length', factor: exact(1) },
  cm: { kind: 'length', factor: exact(10) },
  in: { kind: 'length', factor: exact('25.4') },
  N: { kind: 'force', factor: exact(1) },
  kN: { kind: 'force', factor: exact(1000) },
  lbf: { kind: 'force', factor: exact('4.4482216152605') },
  kPa: { kind: 'pressure', factor: exact(1) },
  MPa: { kind: 'pressure', factor: exact(1000) },
  GPa: { kind: 'pressure', factor: exact('1e6') },
  psi: {
    kind: 'pressure',
    factor: over(exact('4.4482216152605'), times(exact('0.00064516'), exact(1000))),
  },
  '1/GPa': { kind: 'compliance', factor: exact(1) },
  '1/MPa': { kind: 'compliance', factor: exact(1000) },
  µε: { kind: 'strain', factor: exact(1) },
  cycles: { kind: 'cycles', factor: exact(1) },
  '°C': { kind: 'temperature', factor: exact(1), offset: exact(0) },
  '°F': { kind: 'temperature', factor: over(exact(5), exact(9)), offset: exact(32) },
};

/** The value in another unit, or null where the two measure different things or one is not known. */
export function converted(value: Exact, from: string, to: string): Exact | null {
  if (from === to) return value;
  const source = FACTORS[from];
  const target = FACTORS[to];
  if (source === undefined || target === undefined || source.kind !== target.kind) return null;
  const base = times(minus(value, source.offset ?? exact(0)), source.factor);
  return plus(over(base, target.factor), target.offset ?? exact(0));
}
