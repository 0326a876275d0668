export interface NoteBox {
  /** Where its row begins, in px from the top of the ledger. */
  rowTop: number;
  height: number;
}

export interface PlacedNote {
  /** Px below the top of its own row. */
  offset: number;
  /** True while it stands level with its row; a note that had to move down has no leader. */
  leader: boolean;
}

const gapPx = 8;

/** Notes in order of their rows: level with the row, or 8 px below the note before where they would meet. */
export function placeNotes(boxes: readonly NoteBox[]): PlacedNote[] {
  let free = Number.NEGATIVE_INFINITY;
  return boxes.map(({ rowTop, height }) => {
    const top = Math.max(rowTop, free);
    free = top + height + gapPx;
    return { offset: top - rowTop, leader: top === rowTop };
  });
}
