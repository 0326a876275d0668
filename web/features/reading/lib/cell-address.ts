export interface CellPlace {
  row: number;
  column: number;
}

export interface CellRange {
  from: CellPlace;
  to: CellPlace;
}

/** 1 → A, 26 → Z, 27 → AA: the sheet's own column letters. */
export function columnLetters(column: number): string {
  let letters = '';
  for (let rest = column; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}

export function addressOf(place: CellPlace): string {
  return `${columnLetters(place.column)}${place.row}`;
}

/** `G12`, `$G$12` and the first cell of `A9:H9`; null for anything else. */
export function parseAddress(text: string): CellPlace | null {
  const match = /^\$?([A-Za-z]{1,3})\$?([1-9][0-9]{0,6})(?::|$)/.exec(text.trim());
  if (!match?.[1] || !match[2]) return null;
  const column = [...match[1].toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0);
  return { row: Number(match[2]), column };
}

export function parseRange(text: string): CellRange | null {
  const [first = '', last = first] = text.split(':');
  const from = parseAddress(first);
  const to = parseAddress(last);
  return from && to ? { from, to } : null;
}
