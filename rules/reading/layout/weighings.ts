import { plainText } from '../plain-text';
import type { Surroundings, Table } from './table';

const shortNames: [RegExp, string][] = [
  [
    /^(?:a|dry|air|in air|dry in air|in air dry|trocken|luft|sec|air sec|seco|aire|wt\.? dry)(?:\s*\(?a\)?)?$/i,
    'mass-in-air',
  ],
  [
    /^(?:c|water|in water|submerged|sub\.?|immersed|wasser|unter wasser|eau|dans l.eau|agua|en agua|sumergido)(?:\s*\(?[cb]\)?)?$/i,
    'mass-in-water',
  ],
  [/^(?:b|ssd|s\.s\.d\.|surface dry|sss)(?:\s*\(?[bc]\)?)?$/i, 'mass-saturated-surface-dry'],
];

/**
 * "Dry", "SSD" and "Water" are three weighings where they stand together, and nothing alone: then "Dry" is half
 * of a moisture test. So are A, B and C, which elsewhere are trials.
 */
export function weighingOf(text: string): string | null {
  const plain = plainText(text)
    .replace(/\s*[([]\s*(?:g|gm|grams?)\s*[)\]]|,\s*g$|:$/gi, '')
    .trim();
  return shortNames.find(([pattern]) => pattern.test(plain))?.[1] ?? null;
}

/** True where a table weighs specimens in all three ways, by the short names. */
export function hasWeighings(table: Table, { kinds }: Surroundings): boolean {
  const found = new Set<string>();
  let letters = 0;
  const first = table.rows.map(({ cells }) => cells[0]);
  for (const cell of [...table.headings.flatMap(({ cells }) => cells), ...first.slice(0, 40)]) {
    if (!cell || kinds.of(cell) !== 'text' || cell.text.length > 30) continue;
    const name = weighingOf(cell.text);
    if (name) found.add(name);
    if (/^[abc]$/i.test(cell.text.trim())) letters += 1;
  }
  // Three bare letters are trials as long as nothing says grams or SSD.
  const saysGrams = table.headings.some(({ cells }) =>
    cells.some(({ text }) => /\bg\b|gram|ssd|mass|weight|wt/i.test(text)),
  );
  return found.size === 3 && (letters === 0 || saysGrams);
}
