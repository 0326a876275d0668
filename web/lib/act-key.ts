import { useRef } from 'react';
import { newKey } from './new-key';

/**
 * The idempotency key of an act that creates or sends. The same act tried again after a lost answer keeps its key, so
 * that the server recognises it; a changed one gets a new key, and so does the next act after `done`.
 */
export function useActKey(): { keyFor: (act: unknown) => string; done: () => void } {
  const kept = useRef<{ act: string; key: string } | null>(null);
  return {
    keyFor: (act) => {
      const text = JSON.stringify(act, describeFile);
      if (kept.current?.act !== text) kept.current = { act: text, key: newKey() };
      return kept.current.key;
    },
    done: () => {
      kept.current = null;
    },
  };
}

/** A file serialises to nothing, so it is named by what tells two files apart. */
function describeFile(_: string, value: unknown): unknown {
  return value instanceof File ? [value.name, value.size, value.lastModified] : value;
}
