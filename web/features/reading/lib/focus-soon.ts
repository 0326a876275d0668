/** Moves the focus to what is about to be drawn. */
export function focusSoon(id: string): void {
  requestAnimationFrame(() => document.getElementById(id)?.focus());
}
