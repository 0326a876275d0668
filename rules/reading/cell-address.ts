/** `G12` from row 12, column 7. */
export function addressOf(row: number, column: number): string {
  return `${columnLetters(column)}${row}`;
}

export function columnLetters(column: number): string {
  let letters = '';
  for (let rest = column; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}

export function parseAddress(address: string): { row: number; column: number } | null {
  const match = /^\$?([A-Z]{1,3})\$?(\d{1,7})$/.exec(address);
  if (!match) return null;
  return { row: Number(match[2]), column: columnNumber(match[1] as string) };
}

function columnNumber(letters: string): number {
  let column = 0;
  for (const letter of letters) column = column * 26 + letter.charCodeAt(0) - 64;
  return column;
}
