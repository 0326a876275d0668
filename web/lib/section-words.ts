import type { EditionReference } from '#shared/contracts/projects';

/** "Section 412 Dense-graded asphalt mixtures, edition 2026, with Supplement S-07" */
export function sectionWords({
  base,
  layers,
}: {
  base: EditionReference;
  layers: readonly EditionReference[];
}): string {
  const titled = `${base.title}, edition ${base.edition}`;
  return layers.length === 0 ? titled : `${titled}, with ${layers.map((layer) => layer.title).join(' and ')}`;
}
