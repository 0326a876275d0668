import type { CellGrid } from './cell-grid';
import type { ReadingEdition } from './edition-contents';
import { labelReaderOf } from './label-reader-of';
import { CellKinds } from './layout/cell-kind';
import { type LayoutLine, layoutLines } from './layout/layout-lines';
import { labelKey } from './plain-text';
import { SheetIndex } from './sheet-index';

const prefix = 'layout-1:';
/** So many of the smallest hashes stand for all of them: two such samples tell how much two sets have in common. */
const sampleSize = 40;

/**
 * What a layout is known by: its headings and labels, wherever they stand and whatever the values are. Values, further
 * rows and the names of sheets do not move it; a heading more or less moves it a little.
 */
export function fingerprintOf(grid: CellGrid, edition: ReadingEdition): string {
  const around = { kinds: new CellKinds(), labels: labelReaderOf(edition) };
  return fingerprintOfLines(grid.sheets.flatMap((sheet) => layoutLines(new SheetIndex(sheet), around)));
}

export function fingerprintOfLines(lines: readonly LayoutLine[]): string {
  const headings = new Set(
    lines.flatMap(({ isLabel, header }) => (isLabel ? [labelKey(header.at(-1) ?? '')] : [])),
  );
  const hashes = [...new Set([...headings].map(hashOf))].sort();
  return `${prefix}${hashes.slice(0, sampleSize).join('.')}`;
}

/**
 * Whether a layout has a heading. Of a large layout only a sample is kept, so what is not in it may still be one; it is
 * then taken for one, which asks more and assumes less.
 */
export function knowsHeading(fingerprint: string, heading: string): boolean {
  const sample = sampleOf(fingerprint);
  return sample.has(hashOf(labelKey(heading))) || sample.size >= sampleSize;
}

/** How much of two layouts is the same, from 0 to 1. */
export function likeness(one: string, other: string): number {
  if (!one.startsWith(prefix) || !other.startsWith(prefix)) return one === other ? 1 : 0;
  const [first, second] = [sampleOf(one), sampleOf(other)];
  const union = [...new Set([...first, ...second])].sort().slice(0, sampleSize);
  if (union.length === 0) return 0;
  return union.filter((hash) => first.has(hash) && second.has(hash)).length / union.length;
}

/** From here on two workbooks are taken to be of one layout; where they differ is said and doubted. */
const sameFrom = 0.5;

/** The one of several known layouts that a workbook has; null where it has none of them. */
export function closestLayout<Known extends { fingerprint: string }>(
  fingerprint: string,
  known: readonly Known[],
): Known | null {
  let best: { known: Known; likeness: number } | null = null;
  for (const each of known) {
    const found = likeness(fingerprint, each.fingerprint);
    if (found >= sameFrom && (best === null || found > best.likeness))
      best = { known: each, likeness: found };
  }
  return best?.known ?? null;
}

function sampleOf(fingerprint: string): Set<string> {
  return new Set(
    fingerprint
      .slice(prefix.length)
      .split('.')
      .filter((hash) => hash !== ''),
  );
}

/** FNV-1a over UTF-16 units, stirred at the end so that the smallest hashes are a fair sample. */
function hashOf(text: string): string {
  let hash = 0x811c9dc5;
  for (let at = 0; at < text.length; at += 1) {
    hash ^= text.charCodeAt(at);
    hash = Math.imul(hash, 0x01000193);
  }
  hash ^= hash >>> 16;
  hash = Math.imul(hash, 0x85ebca6b);
  hash ^= hash >>> 13;
  return (hash >>> 0).toString(16).padStart(8, '0');
}
