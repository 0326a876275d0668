import Decimal from 'decimal.js';
import unitmath from 'unitmath/dist/UnitMath.js';
import { unitDefinitions, unitTable } from './unit-table';

export type Conversion = { ok: true; value: number } | { ok: false; reason: string };

/**
 * A value in another unit of the same kind. Temperatures are points on their scale, so they move by the
 * offset too; a difference of temperatures is not to be converted with this.
 *
 * A percentage is never converted to a fraction here: which of the two a cell means is for the reader to tell.
 */
export function convert(value: number, fromUnit: string, toUnit: string): Conversion {
  if (!Number.isFinite(value)) return { ok: false, reason: 'the value is not a number' };
  const from = normaliseUnit(fromUnit);
  if (from === null) return { ok: false, reason: `the unit "${fromUnit}" is not known` };
  const to = normaliseUnit(toUnit);
  if (to === null) return { ok: false, reason: `the unit "${toUnit}" is not known` };
  if (from === to) return { ok: true, value };
  try {
    return settle(library(value, expressions.get(from)!).to(expressions.get(to)!).value, to);
  } catch {
    // The library throws on two units of different kinds; that is an answer here, not a failure.
    return { ok: false, reason: `${from} cannot be converted to ${to}` };
  }
}

/** The registry's way of writing a unit, or null where the unit is not known. */
export function normaliseUnit(text: string): string | null {
  const exact = text.trim();
  if (expressions.has(exact)) return exact;
  const key = aliasKey(exact);
  return withCase.get(key) ?? withoutCase.get(key.toLowerCase()) ?? null;
}

const library = unitmath.config({ definitions: unitDefinitions });

const expressions = new Map(unitTable.map((entry) => [entry.unit, entry.expression]));
const withCase = new Map<string, string>();
/** Null where two units differ only by case (mPa·s and MPa·s would): then case must be kept. */
const withoutCase = new Map<string, string | null>();

for (const { unit, aliases } of unitTable) {
  for (const name of [unit, ...aliases]) {
    const key = aliasKey(name);
    withCase.set(key, unit);
    const folded = key.toLowerCase();
    const seen = withoutCase.get(folded);
    withoutCase.set(folded, seen === undefined || seen === unit ? unit : null);
  }
}

function aliasKey(text: string): string {
  return text
    .normalize('NFKC')
    .replace(/[μµ]/g, 'µ')
    .replace(/[−‐-–]/g, '-')
    .replace(/[⋅·∙•]/g, '·')
    .replace(/\s+/g, ' ')
    .trim()
    .replace(/^[([]+|[)\]]+$/g, '')
    .trim();
}

/** Binary noise of the conversion (77 °F as 25.000000000000057 °C) would show and could cross a limit. */
function settle(value: number, unit: string): Conversion {
  if (!Number.isFinite(value)) return { ok: false, reason: 'the value cannot be converted' };
  const decimal = new Decimal(value);
  const affine = unit === '°C' || unit === '°F' || unit === 'K';
  return {
    ok: true,
    value: (affine ? decimal.toDecimalPlaces(9) : decimal.toSignificantDigits(13)).toNumber(),
  };
}
