import type { ReadingView } from '#shared/contracts/readings';

export interface Place {
  sheet: string;
  cell: string;
}

/** Where the cell cursor begins: at the first doubt without an answer, else at the first reading, else at A1. */
export function firstPlace(reading: Pick<ReadingView, 'doubts' | 'understood' | 'sheets'>): Place {
  const open = reading.doubts.find((doubt) => doubt.answer === null);
  if (open) return { sheet: open.sheet, cell: open.cell };
  const first = reading.understood[0];
  if (first) return { sheet: first.sheet, cell: first.cell };
  return { sheet: reading.sheets.find((sheet) => !sheet.hidden)?.name ?? '', cell: 'A1' };
}
