import { useEffect, useState } from 'react';
import type { Cell } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { cellToGoToId } from '../hooks/use-reading-keys';
import { addressOf, type CellRange, parseAddress } from '../lib/cell-address';
import { blockText, cellCount } from '../lib/cell-block';
import type { Place } from '../lib/first-place';

/** The cell at the cursor: its address, what the workbook holds, and what it was taken for. */
export function FormulaLine({
  cursor,
  onCursor,
  block,
  content: { cell, use },
  reading,
  onOpen,
}: {
  cursor: Place;
  onCursor: (place: Place) => void;
  /** What is chosen beyond the cell at the cursor. */
  block: CellRange | null;
  content: { cell?: Cell; use?: CellUse };
  reading: ReadingView;
  /** Null for a reader who may not say what cells are. */
  onOpen: (() => void) | null;
}) {
  const [typed, setTyped] = useState(cursor.cell);
  useEffect(() => setTyped(cursor.cell), [cursor.cell]);
  const place = parseAddress(typed);
  const go = () => {
    if (place) onCursor({ sheet: cursor.sheet, cell: addressOf(place) });
    else setTyped(cursor.cell);
  };
  return (
    <div className="formula-line">
      <input
        id={cellToGoToId}
        className="formula-address"
        aria-label="Cell to go to"
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
        onFocus={(event) => event.target.select()}
        onBlur={go}
        onKeyDown={(event) => {
          if (event.key === 'Enter') go();
          if (event.key === 'Escape') setTyped(cursor.cell);
        }}
        spellCheck={false}
        autoComplete="off"
      />
      <span>{cell ? (cell.formula ? `=${cell.formula.replace(/^=/, '')}` : cell.text) : ''}</span>
      <span className="formula-taken">
        <span className="mute" aria-live="polite">
          {block
            ? `${blockText(block)} · ${countInFigures(cellCount(block), 'cell')}`
            : takenFor({ cell, use, cursor, reading })}
        </span>
        {onOpen ? (
          <button type="button" className="cell-link small" onClick={onOpen}>
            {block ? 'Say what they are' : 'Say what it is'}
          </button>
        ) : null}
      </span>
    </div>
  );
}

function takenFor(options: {
  cell: Cell | undefined;
  use: CellUse | undefined;
  cursor: Place;
  reading: ReadingView;
}): string {
  const { cell, use, cursor, reading } = options;
  const note = cell?.comment ? ` · note: ${cell.comment}` : '';
  const doubt = reading.doubts.find((one) => one.sheet === cursor.sheet && one.cell === cursor.cell);
  if (doubt && doubt.answer === null) return `in doubt, ${doubt.letter}${note}`;
  if (use && use.taken !== '') return `${use.taken}${note}`;
  const unread = reading.unread.find((one) => one.sheet === cursor.sheet && one.cell === cursor.cell);
  if (unread) return `not used: ${unread.reason}${note}`;
  return cell ? note.replace(/^ · /, '') : 'empty';
}
