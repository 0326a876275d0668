import { formatPlain, groupThousands } from './numbers';

const plain = new Set(['1', '', 'none', 'dimensionless']);

/** A unit as people read it; a ratio has none. */
export function unitWord(unit: string): string {
  return plain.has(unit) ? '' : unit;
}

/** A number and its unit with a space between: "5.6 %", "1,000 s", "0.95". */
export function withUnit(number: string, unit: string): string {
  const word = unitWord(unit);
  return word === '' ? groupThousands(number) : `${groupThousands(number)} ${word}`;
}

/** "184 kB", "1.2 MB" of a file. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`;
  if (bytes < 1_000_000) return `${Math.round(bytes / 1000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}

/** "1 in 1.5 in": sieves by their opening, "12.5 mm". */
export function formatSieve(openingMm: number): string {
  return `${formatPlain(openingMm)} mm`;
}
