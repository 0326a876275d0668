import type { SheetGrid } from '../cell-grid';
import { plainText } from '../plain-text';

/** Which mark a sheet's typed figures use; a lone comma before other than three digits can only be one. */
export function decimalMark(sheet: SheetGrid): '.' | ',' {
  let commas = 0;
  let points = 0;
  for (const { kind, text } of sheet.cells) {
    if (kind !== 'text' || text.length > 16) continue;
    const plain = plainText(text);
    const body = /^[<>]?\s*[-+]?(\d+(?:[.,' ]\d+)*)(?!\s*[-/:.,]?\d)/.exec(plain)?.[1] ?? '';
    // A date or a clause has its mark more than once.
    if (body === '' || /^\d+([.,])\d{1,2}\1\d+/.test(body)) continue;
    if (
      /,\d+$/.test(body) &&
      (!/,\d{3}$/.test(body) || /^0,|\d{4,},/.test(body)) &&
      !/^\d{1,3}(?:,\d{3})+$/.test(body)
    )
      commas += 1;
    else if (/^0,\d{3}$/.test(body)) commas += 1;
    else if (
      /\.\d+$/.test(body) &&
      (!/\.\d{3}$/.test(body) || /^0\./.test(body)) &&
      !/^\d{1,3}(?:\.\d{3})+$/.test(body)
    )
      points += 1;
  }
  return commas > 0 && points * 20 < commas ? ',' : '.';
}
