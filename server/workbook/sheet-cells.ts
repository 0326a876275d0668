import type { Cell } from '#rules/reading/cell-grid';
import { formatDate, formatNumber, isDateFormat } from './number-format';
import type { CellStyle } from './workbook-styles';

export interface StoredCell {
  address: string;
  row: number;
  column: number;
  /** The file's own type letter: n, s, str, inlineStr, b, e, d. */
  type: string;
  /** What the value element holds; null where there is none. */
  stored: string | null;
  formula: string | null;
  style: CellStyle | undefined;
}

/** One stored cell as the grid keeps it, or null where it holds nothing. */
export function toCell(stored: StoredCell, date1904: boolean): Cell | null {
  const { address, row, column, formula } = stored;
  const format = stored.style?.format ?? 'General';
  const base = {
    address,
    row,
    column,
    format: format === 'General' ? null : format,
    formula,
    cached: formula !== null && stored.stored !== null && stored.stored !== '',
    comment: null,
    bold: stored.style?.bold ?? false,
  };
  if (stored.stored === null || stored.stored === '') {
    // A formula whose result is an empty text shows nothing: it is a blank, not a formula without result.
    if (formula === null || stored.type === 'str') return null;
    return { ...base, kind: 'formula-without-result', value: '', text: '' };
  }
  const value = stored.stored;
  switch (stored.type) {
    case 's':
    case 'str':
    case 'inlineStr':
      return { ...base, kind: 'text', value, text: value };
    case 'b':
      return {
        ...base,
        kind: 'boolean',
        value: value === '1' ? 'true' : 'false',
        text: value === '1' ? 'TRUE' : 'FALSE',
      };
    case 'e':
      return { ...base, kind: 'error', value, text: value };
    case 'd':
      return {
        ...base,
        kind: 'date',
        value,
        text: formatDate(value, isDateFormat(format) ? format : 'yyyy-mm-dd'),
      };
    default:
      return numberCell(base, value, format, date1904);
  }
}

function numberCell(
  base: Omit<Cell, 'kind' | 'value' | 'text'>,
  raw: string,
  format: string,
  date1904: boolean,
): Cell {
  const number = Number(raw);
  if (!Number.isFinite(number)) return { ...base, kind: 'text', value: raw, text: raw };
  if (isDateFormat(format)) {
    const iso = serialToIso(number, date1904);
    if (iso !== null) return { ...base, kind: 'date', value: iso, text: formatDate(iso, format) };
  }
  const value = String(number);
  return { ...base, kind: 'number', value, text: formatNumber(value, format) };
}

const dayMilliseconds = 86_400_000;

/** A stored serial as an ISO date. The 1900 system counts a 29 February 1900 that never was. */
export function serialToIso(serial: number, date1904: boolean): string | null {
  if (serial < 0 || serial > 2_958_465.99) return null;
  const epoch = date1904 ? Date.UTC(1904, 0, 1) : Date.UTC(1899, 11, serial < 60 ? 31 : 30);
  const instant = new Date(epoch + Math.round(serial * 86_400) * 1000);
  const hasTime = Math.round(serial * 86_400) % 86_400 !== 0;
  const iso = instant.toISOString();
  return instant.getTime() % dayMilliseconds === 0 && !hasTime ? iso.slice(0, 10) : iso.slice(0, 19);
}
