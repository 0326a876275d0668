import { columnLetters, parseAddress } from '#rules/reading/cell-address';

/** A shared formula is stored once; at its other cells relative references move with the cell. */
export function shiftFormula(formula: string, rows: number, columns: number): string {
  return formula.replace(
    /"[^"]*"|'[^']*'!?|(\$?)([A-Z]{1,3})(\$?)(\d{1,7})(?![\d(A-Za-z_.])/g,
    (
      match,
      fixedColumn: string | undefined,
      letters: string | undefined,
      fixedRow: string,
      digits: string,
      at: number,
    ) => {
      if (letters === undefined || /[A-Za-z0-9_.]/.test(formula[at - 1] ?? '')) return match;
      const address = parseAddress(`${letters}${digits}`);
      if (!address) return match;
      const column = fixedColumn === '$' ? address.column : address.column + columns;
      const row = fixedRow === '$' ? address.row : address.row + rows;
      if (column < 1 || row < 1) return '#REF!';
      return `${fixedColumn ?? ''}${columnLetters(column)}${fixedRow}${row}`;
    },
  );
}
