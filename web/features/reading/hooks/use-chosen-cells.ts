import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { sheetQuery } from '../../../lib/queries/sheet-query';
import { addressOf, type CellRange, parseAddress } from '../lib/cell-address';
import { blockBetween } from '../lib/cell-block';
import type { Place } from '../lib/first-place';
import { mergesOf, wholeCell } from '../lib/merges';
import { blockRows } from '../lib/row-window';
import { useCellCursor } from './use-cell-cursor';

export interface ChosenCells {
  cursor: Place;
  /** The moving end of a block that begins at the cursor; null where one cell is chosen. */
  reach: string | null;
  /** All that is chosen: the cell at the cursor, with its merge, or the block. */
  block: CellRange;
  setCursor: (place: Place) => void;
  setReach: (cell: string | null) => void;
  choose: (block: CellRange) => void;
}

/** The cell at the cursor and the block that reaches from it. A cursor that moves lets the block go. */
export function useChosenCells(params: RevisionParams, first: Place): ChosenCells {
  const [cursor, moveCursor] = useCellCursor(first);
  const [chosen, setChosen] = useState<{ from: Place; reach: string } | null>(null);
  const { data } = useQuery(sheetQuery({ ...params, sheet: cursor.sheet, from: 1, to: blockRows }));
  const merges = useMemo(() => (data ? mergesOf(data.sheet) : []), [data]);
  const isFrom = chosen?.from.sheet === cursor.sheet && chosen.from.cell === cursor.cell;
  const reach = isFrom ? chosen.reach : null;
  const block = useMemo(() => {
    const start = parseAddress(cursor.cell) ?? { row: 1, column: 1 };
    const end = reach === null ? null : parseAddress(reach);
    return end ? blockBetween(start, end, merges) : wholeCell(merges, start);
  }, [cursor.cell, reach, merges]);
  const choose = ({ from, to }: CellRange) => {
    const place = { sheet: cursor.sheet, cell: addressOf(from) };
    moveCursor(place);
    setChosen({ from: place, reach: addressOf(to) });
  };
  return {
    cursor,
    reach,
    block,
    setCursor: (place) => {
      setChosen(null);
      moveCursor(place);
    },
    setReach: (cell) => setChosen(cell === null ? null : { from: cursor, reach: cell }),
    choose,
  };
}
