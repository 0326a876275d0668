import { cannot, known, type NumericResult } from '../numerics/numeric-result';

export interface RecycledMaterial {
  /** Recycled material in the mix, % of mix by mass. */
  contentPercent: number;
  /** Its binder content, % of its own mass. */
  binderPercent: number;
}

/**
 * Recycled binder ratio. RBR = Σ(content·binder/100)/Pb.
 *
 * Symbols: content of reclaimed pavement or shingles, % of mix; binder their binder content, %; Pb total binder
 * content of the mix, %. No unit.
 * Source: AASHTO M 323; from memory, verify. Domain: at least one material, nothing below zero, Pb above zero.
 *
 * @example recycledBinderRatio([{ contentPercent: 20, binderPercent: 5 }], 5) // 0.2
 */
export function recycledBinderRatio(materials: readonly RecycledMaterial[], Pb: number): NumericResult {
  if (materials.length === 0) return cannot('no recycled material is stated');
  if (!(Pb > 0) || Pb >= 100) return cannot('Pb must be above 0 and below 100');
  if (!materials.every(({ contentPercent, binderPercent }) => contentPercent >= 0 && binderPercent >= 0)) {
    return cannot('a content is missing or below zero');
  }
  const recycled = materials.reduce((sum, material) => sum + recycledBinder(material), 0);
  return known(recycled / Pb);
}

function recycledBinder({ contentPercent, binderPercent }: RecycledMaterial): number {
  return (contentPercent * binderPercent) / 100;
}
