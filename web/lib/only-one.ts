/** The choice that needs no choosing. */
export function onlyOne<Item>(items: readonly Item[]): Item | null {
  return items.length === 1 ? (items[0] ?? null) : null;
}
