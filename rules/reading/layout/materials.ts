/** Shares of materials: in a table of names, "RAP" and "Natural sand" are the materials themselves and no quantities. */
export const materialShares: ReadonlySet<string> = new Set([
  'rap-content',
  'ras-content',
  'lime-content',
  'natural-sand-content',
  'mineral-filler-content',
  'crumb-rubber-content',
  'fibre-content',
  'baghouse-fines-content',
  'glass-content',
]);

export function isMaterial(quantities: readonly string[]): boolean {
  return quantities.length > 0 && quantities.every((id) => materialShares.has(id));
}
