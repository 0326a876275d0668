/**
 * Sieves are identified by their opening in mm. US names are nominal, not conversions: 3/4 in is 19.0 mm and
 * never 19.05 (ASTM E11-01, Table 1; numbers below No. 7 from memory, verify).
 */
export function sieveFromName(text: string): number | null {
  const name = text.normalize('NFKC').replace(/⁄/g, '/').replace(/\s+/g, ' ').trim();
  return fromNumber(name) ?? fromInches(name) ?? fromMetric(name);
}

/** "12.5 mm", "19 mm", "0.075 mm". */
export function sieveLabel(openingMm: number): string {
  return `${openingMm} mm`;
}

/** "3/4 in", "No. 200", or null where the US series has no such sieve. */
export function usSieveName(openingMm: number): string | null {
  return usSieves.find(([, opening]) => Number(opening) === openingMm)?.[0] ?? null;
}

/** Full US series, coarse to fine. */
export function usSieveOpeningsMm(): number[] {
  return usSieves.map(([, opening]) => Number(opening));
}

/** Base set with sets 1 and 2, coarse to fine (EN 933-2; from memory, verify). */
export function enSieveOpeningsMm(): number[] {
  return [...enSieves];
}

/** True where the opening belongs to either series. */
export function isStandardSieve(openingMm: number): boolean {
  return standardOpenings.has(openingMm);
}

/** Name and opening as the standard writes it. */
const usSieves: readonly (readonly [string, string])[] = [
  ['5 in', '125'],
  ['4.24 in', '106'],
  ['4 in', '100'],
  ['3 1/2 in', '90'],
  ['3 in', '75'],
  ['2 1/2 in', '63'],
  ['2.12 in', '53'],
  ['2 in', '50'],
  ['1 3/4 in', '45'],
  ['1 1/2 in', '37.5'],
  ['1 1/4 in', '31.5'],
  ['1.06 in', '26.5'],
  ['1 in', '25.0'],
  ['7/8 in', '22.4'],
  ['3/4 in', '19.0'],
  ['5/8 in', '16.0'],
  ['0.530 in', '13.2'],
  ['1/2 in', '12.5'],
  ['7/16 in', '11.2'],
  ['3/8 in', '9.5'],
  ['5/16 in', '8.0'],
  ['0.265 in', '6.7'],
  ['1/4 in', '6.3'],
  ['No. 3 1/2', '5.6'],
  ['No. 4', '4.75'],
  ['No. 5', '4.00'],
  ['No. 6', '3.35'],
  ['No. 7', '2.80'],
  ['No. 8', '2.36'],
  ['No. 10', '2.00'],
  ['No. 12', '1.70'],
  ['No. 14', '1.40'],
  ['No. 16', '1.18'],
  ['No. 18', '1.00'],
  ['No. 20', '0.850'],
  ['No. 25', '0.710'],
  ['No. 30', '0.600'],
  ['No. 35', '0.500'],
  ['No. 40', '0.425'],
  ['No. 45', '0.355'],
  ['No. 50', '0.300'],
  ['No. 60', '0.250'],
  ['No. 70', '0.212'],
  ['No. 80', '0.180'],
  ['No. 100', '0.150'],
  ['No. 120', '0.125'],
  ['No. 140', '0.106'],
  ['No. 170', '0.090'],
  ['No. 200', '0.075'],
  ['No. 230', '0.063'],
  ['No. 270', '0.053'],
  ['No. 325', '0.045'],
  ['No. 400', '0.038'],
];

const enSieves = [
  63, 45, 40, 31.5, 22.4, 20, 16, 14, 12.5, 11.2, 10, 8, 6.3, 5.6, 4, 2, 1, 0.5, 0.25, 0.125, 0.063,
];

const standardOpenings = new Set([...usSieves.map(([, opening]) => Number(opening)), ...enSieves]);

/** Openings of superseded editions that workbooks still carry, and conversions taken for openings. */
const formerOpenings = new Map([
  // EN sizes are also written rounded (EN 13043, Table 1; from memory, verify).
  [31, 31.5],
  [22, 22.4],
  [11, 11.2],
  [76.2, 75],
  [63.5, 63],
  [50.8, 50],
  [38.1, 37.5],
  [25.4, 25],
  [22.2, 22.4],
  [19.05, 19],
  [19.1, 19],
  [15.9, 16],
  [12.7, 12.5],
  [9.51, 9.5],
  [9.52, 9.5],
  [9.525, 9.5],
  [6.35, 6.3],
  [4.76, 4.75],
  [2.38, 2.36],
  [1.19, 1.18],
  [0.59, 0.6],
  [0.595, 0.6],
  [0.297, 0.3],
  [0.149, 0.15],
  [0.074, 0.075],
]);

function fromNumber(name: string): number | null {
  const match = /^(?:no\.?|number|#|sieve no\.?|us no\.?)\s*(\d+(?: 1\/2)?)(?: sieve)?$/i.exec(name);
  if (!match) return null;
  const opening = usSieves.find(([us]) => us === `No. ${match[1]}`)?.[1];
  return opening === undefined ? null : Number(opening);
}

function fromInches(name: string): number | null {
  const match = /^(\d+)?[ -]?(\d+\/\d+)?\s*(?:in\.?|inch|inches|"|″|”|'')?(?: sieve)?$/i.exec(name);
  const marked = /(?:in\.?|inch|inches|"|″|”|'')(?: sieve)?$/i.test(name);
  if (match && (marked || match[2])) {
    const us = [match[1], match[2]].filter(Boolean).join(' ');
    const opening = usSieves.find(([known]) => known === `${us} in`)?.[1];
    return opening === undefined ? null : Number(opening);
  }
  const decimal = /^(\d*\.\d+)\s*(?:in\.?|inch|inches|"|″|”)(?: sieve)?$/i.exec(name);
  return decimal ? fromDecimalInches(Number(decimal[1])) : null;
}

/** `0.75 in` and `1.5 in` are written too; they name the sieve of that fraction. */
function fromDecimalInches(inches: number): number | null {
  const sieve = usSieves.find(([us]) => us.endsWith(' in') && Math.abs(inchesOf(us) - inches) < 0.0015);
  return sieve ? Number(sieve[1]) : null;
}

function inchesOf(usName: string): number {
  return usName
    .replace(' in', '')
    .split(' ')
    .reduce((sum, part) => {
      const [top, bottom] = part.split('/').map(Number);
      return sum + top! / (bottom ?? 1);
    }, 0);
}

function fromMetric(name: string): number | null {
  const match = /^(\d+(?:[.,]\d+)?|[.,]\d+)\s*(mm|[µμ]m|um|microns?)?(?: sieve)?$/i.exec(name);
  if (!match) return null;
  const value = Number(match[1]!.replace(',', '.'));
  const openingMm = match[2] && !/^mm$/i.test(match[2]) ? value / 1000 : value;
  if (standardOpenings.has(openingMm)) return openingMm;
  return formerOpenings.get(openingMm) ?? null;
}
