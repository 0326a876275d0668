/** A key as printed on it. `hidden` where the words beside it already say what happens. */
export function Kbd({ children, hidden = false }: { children: string; hidden?: boolean }) {
  return <kbd aria-hidden={hidden || undefined}>{children}</kbd>;
}
