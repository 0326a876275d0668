import { useCallback, useRef } from 'react';

/** The same function at every drawing, which does what the newest one says: what it is given to need not draw again. */
export function useStable<Given extends unknown[], Result>(
  act: (...given: Given) => Result,
): (...given: Given) => Result {
  const latest = useRef(act);
  latest.current = act;
  return useCallback((...given) => latest.current(...given), []);
}
