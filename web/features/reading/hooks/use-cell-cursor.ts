import { useEffect, useRef, useState } from 'react';
import { useNavigation, useSearchParams } from 'react-router-dom';
import type { Place } from '../lib/first-place';

const settleMilliseconds = 300;

/**
 * The cell cursor. The address names it, so that a place can be sent and gone back to; but a held arrow key moves
 * faster than a browser lets an address change, so the address follows when the cursor rests.
 */
export function useCellCursor(first: Place): [Place, (place: Place) => void] {
  const [search, setSearch] = useSearchParams();
  // The first open doubt is another one after each answer; the cursor must not move by itself.
  const [start] = useState(first);
  const named = placeOf(search, start);
  const [cursor, setCursor] = useState(named);
  const addressed = useRef(keyOf(named));
  const namedKey = keyOf(named);
  // biome-ignore lint/correctness/useExhaustiveDependencies: only a changed address moves the cursor.
  useEffect(() => {
    if (namedKey === addressed.current) return;
    addressed.current = namedKey;
    setCursor(named);
  }, [namedKey]);
  // Whoever is on the way to another page would be called back by an address that follows now.
  const leaving = useNavigation().state !== 'idle';
  useEffect(() => {
    if (leaving || keyOf(cursor) === addressed.current) return;
    const timer = setTimeout(() => {
      addressed.current = keyOf(cursor);
      setSearch({ sheet: cursor.sheet, cell: cursor.cell }, { replace: true, preventScrollReset: true });
    }, settleMilliseconds);
    return () => clearTimeout(timer);
  }, [cursor, setSearch, leaving]);
  return [cursor, setCursor];
}

function placeOf(search: URLSearchParams, first: Place): Place {
  const sheet = search.get('sheet');
  if (sheet === null) return first;
  return { sheet, cell: search.get('cell') ?? 'A1' };
}

function keyOf({ sheet, cell }: Place): string {
  return `${sheet}!${cell}`;
}
