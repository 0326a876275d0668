import { useSyncExternalStore } from 'react';

let open = false;
const listeners = new Set<() => void>();

export function openKeyList(): void {
  setKeyListOpen(true);
}

export function setKeyListOpen(next: boolean): void {
  open = next;
  for (const listener of listeners) listener();
}

export function useKeyListOpen(): boolean {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => open,
  );
}
