import type { LimitTable } from '#rules/rule-sets/table';

type Row = LimitTable['rows'][number];
type Cell = Row[string];

/** What a table has to say of a cell that cannot be read; it is shown at the cell. */
export type ReadCell = { ok: true; cell: Cell } | { ok: false; detail: string };

const number = String.raw`-?\d+(?:\.\d+)?`;

/** A key as a printed table writes it: "12.5", "under 3", "3 to under 10", "30 and over", or a word. */
export function readKey(text: string): ReadCell {
  const plain = text
    .trim()
    .replace(/\s+/g, ' ')
    .replace(/[−–](?=\d)/g, '-');
  if (plain === '') return { ok: false, detail: 'Give a value, or a range such as 3 to under 10.' };
  const from = new RegExp(
    `^(?:>=|≥|from|at least) ?(${number})$|^(${number}) ?(?:and over|and above|or more|\\+)$`,
    'i',
  );
  const below = new RegExp(`^(?:<|under|below|less than) ?(${number})$`, 'i');
  const both = new RegExp(
    `^(?:from )?(${number}) ?(?:to (?:under|below|<)|to less than|\\.\\.) ?(${number})$`,
    'i',
  );
  const open = from.exec(plain);
  if (open) return { ok: true, cell: { from: Number(open[1] ?? open[2]) } };
  const end = below.exec(plain);
  if (end) return { ok: true, cell: { below: Number(end[1]) } };
  const range = both.exec(plain);
  if (range) return { ok: true, cell: { from: Number(range[1]), below: Number(range[2]) } };
  if (new RegExp(`^${number} ?(?:to|-|–) ?${number}$`).test(plain)) {
    // A wrong guess here would judge a mix by another row's limit.
    return { ok: false, detail: 'Say whether the end belongs to the row: 3 to under 10.' };
  }
  return { ok: true, cell: new RegExp(`^${number}$`).test(plain) ? Number(plain) : plain };
}

/** A limit keeps the decimals that it is written with; an empty cell sets no limit. */
export function readLimit(text: string): ReadCell {
  const plain = text.trim().replace(/−/g, '-');
  if (plain === '' || plain === '–' || plain === '-') return { ok: true, cell: null };
  if (new RegExp(`^${number}$`).test(plain)) return { ok: true, cell: plain };
  if (/^-?\d+,\d+$/.test(plain)) return { ok: true, cell: plain.replace(',', '.') };
  if (/\d/.test(plain) && !/[a-z]/i.test(plain)) {
    return { ok: false, detail: 'Write a number such as 14.0, or leave the cell empty.' };
  }
  return { ok: true, cell: plain };
}

export function cellText(cell: Cell | undefined): string {
  if (cell === undefined || cell === null) return '';
  if (Array.isArray(cell)) return cell.join(', ');
  if (typeof cell !== 'object') return String(cell);
  const { from, below } = cell;
  if (from === undefined) return below === undefined ? '' : `under ${below}`;
  return below === undefined ? `${from} and over` : `${from} to under ${below}`;
}

/** Rows pasted from a spreadsheet or a document's table: cells by tab, rows by line. */
export function rowsOfText(text: string): string[][] {
  return text
    .replace(/\r\n?/g, '\n')
    .replace(/\n+$/, '')
    .split('\n')
    .map((line) => line.split('\t'));
}

export function textOfRows(rows: readonly (readonly string[])[]): string {
  return rows.map((row) => row.join('\t')).join('\n');
}
