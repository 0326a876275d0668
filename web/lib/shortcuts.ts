import { useEffect, useRef, useSyncExternalStore } from 'react';

export interface Shortcut {
  /** As `KeyboardEvent.key`: `j`, `?`, `Enter`, `/`. */
  key: string;
  /** What it does, in a word or two: "next". */
  label: string;
  run: (event: KeyboardEvent) => void;
  /** Shown in the running foot; the list of all keys shows every one. */
  foot?: boolean;
  /** Needs Ctrl (or Command): such keys act inside fields too and stay on when single keys are off. */
  ctrl?: boolean;
  /** Bound elsewhere, by a focused control itself; listed only. */
  listedOnly?: boolean;
}

const singleKeysOff = 'clauseway.single-keys-off';
const listeners = new Set<() => void>();
let registered: readonly (readonly Shortcut[])[] = [];
let snapshot: readonly Shortcut[] = [];
let single = readSingleKeys();

/** Binds keys while the component is on the page; the last one mounted wins where two bind the same key. */
export function useShortcuts(shortcuts: readonly Shortcut[]): void {
  const latest = useRef(shortcuts);
  latest.current = shortcuts;
  const shape = shortcuts.map((each) => `${each.key}\n${each.label}\n${each.foot}`).join('\n\n');
  // biome-ignore lint/correctness/useExhaustiveDependencies: what a key runs is read at the key press; only the list of keys re-registers.
  useEffect(() => {
    const live = latest.current.map((each, index) => ({
      ...each,
      run: (event: KeyboardEvent) => latest.current[index]?.run(event),
    }));
    registered = [...registered, live];
    changed();
    return () => {
      registered = registered.filter((each) => each !== live);
      changed();
    };
  }, [shape]);
}

export function useRegisteredShortcuts(): readonly Shortcut[] {
  return useSyncExternalStore(subscribe, () => snapshot);
}

export function useSingleKeys(): [boolean, (on: boolean) => void] {
  return [useSyncExternalStore(subscribe, () => single), setSingleKeys];
}

export function setSingleKeys(on: boolean): void {
  single = on;
  try {
    if (on) localStorage.removeItem(singleKeysOff);
    else localStorage.setItem(singleKeysOff, '1');
  } catch {
    // Without storage the choice holds until the page is left.
  }
  changed();
}

/** Listens once for the whole page. */
export function listenForShortcuts(target: Document): () => void {
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.defaultPrevented) return;
    const shortcut = snapshot.find((each) => !each.listedOnly && matches(each, event));
    if (!shortcut) return;
    event.preventDefault();
    shortcut.run(event);
  };
  target.addEventListener('keydown', onKeyDown);
  return () => target.removeEventListener('keydown', onKeyDown);
}

function matches(shortcut: Shortcut, event: KeyboardEvent): boolean {
  if (event.altKey) return false;
  const withCtrl = event.ctrlKey || event.metaKey;
  if (shortcut.ctrl) return withCtrl && event.key === shortcut.key;
  if (withCtrl || event.key.toLowerCase() !== shortcut.key.toLowerCase()) return false;
  if (event.shiftKey && /^[a-z]$/i.test(event.key)) return false;
  if (event.key === 'Enter' && followsItself(event.target)) return false;
  return (single || shortcut.key.length > 1) && !takesKeys(event.target);
}

/** Enter on a focused link or button is that link's or button's own. */
function followsItself(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('a[href], button, summary, [role="button"]') !== null;
}

const takers =
  'input, textarea, select, [contenteditable="true"], [role="menu"], [role="listbox"], [role="dialog"]';

/** Fields, menus and lists use letters themselves, so single keys do nothing there (WCAG 2.1.4). */
function takesKeys(target: EventTarget | null): boolean {
  if (!(target instanceof Element)) return false;
  const taker = target.closest(takers);
  if (!(taker instanceof HTMLInputElement)) return taker !== null;
  return !['radio', 'checkbox', 'button', 'submit', 'file'].includes(taker.type);
}

function changed(): void {
  const byKey = new Map<string, Shortcut>();
  for (const group of registered) {
    for (const shortcut of group) byKey.set(`${shortcut.ctrl ? 'ctrl ' : ''}${shortcut.key}`, shortcut);
  }
  snapshot = [...byKey.values()];
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function readSingleKeys(): boolean {
  try {
    return localStorage.getItem(singleKeysOff) === null;
  } catch {
    return true;
  }
}
