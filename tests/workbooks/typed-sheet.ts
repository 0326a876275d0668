import { addressOf } from '#rules/reading/cell-address';
import type { GridCell, GridSheet } from './grid-of';

/**
 * A sheet as lines of text, a column between bars. A figure is a number, `=4.5%` a number in a percent format,
 * `'4.5` a text, `Trial A {3}` a text merged over three columns.
 */
export function typedSheet(text: string, more: Omit<GridSheet, 'cells' | 'merges'> = {}): GridSheet {
  const cells: Record<string, GridCell> = {};
  const merges: string[] = [];
  const lines = text
    .replace(/^\n/, '')
    .replace(/\n\s*$/, '')
    .split('\n');
  for (const [row, line] of lines.entries()) {
    for (const [column, field] of line.split('|').entries()) {
      const written = field.trim();
      if (written === '') continue;
      const merged = /^(.*?)\s*\{(\d+)\}$/.exec(written);
      const address = addressOf(row + 1, column + 1);
      if (merged) merges.push(`${address}:${addressOf(row + 1, column + Number(merged[2]))}`);
      cells[address] = cellOf(merged?.[1] ?? written);
    }
  }
  return { ...more, cells, merges };
}

function cellOf(written: string): GridCell {
  const percent = /^=(-?[\d.]+)%$/.exec(written);
  if (percent) {
    return {
      kind: 'number',
      value: String(Number(percent[1]) / 100),
      text: `${percent[1]}%`,
      format: '0.0%',
    };
  }
  if (written.startsWith('#') && written.endsWith('!'))
    return { kind: 'error', value: written, text: written };
  if (written === '=?') return { kind: 'formula-without-result', value: '', text: '', formula: 'A1/B1' };
  if (written.startsWith("'")) return written.slice(1);
  return /^-?(?:\d+\.?\d*|\.\d+)(?:e-?\d+)?$/i.test(written) ? Number(written) : written;
}
