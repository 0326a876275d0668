interface Titled {
  title: string;
  edition: string;
}

/** "Section 412 Dense-graded asphalt mixtures, edition 2026, with Supplement S-07" */
export function sectionWords({
  base,
  layers,
}: {
  base: Titled;
  layers: readonly Pick<Titled, 'title'>[];
}): string {
  return `${editionWords(base)}${withLayers(layers.map(({ title }) => title))}`;
}

/** "Section 412 Dense-graded asphalt mixtures, edition 2026" */
export function editionWords({ title, edition }: Titled): string {
  return `${title}, edition ${edition}`;
}

/** ", with Supplement S-07 and Special provision 3", as it follows the edition that the layers stand over. */
export function withLayers(titles: readonly string[]): string {
  return titles.length === 0 ? '' : `, with ${titles.join(' and ')}`;
}
