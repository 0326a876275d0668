import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

/*
 * Symbols, throughout: Pb binder content, % of mix by mass; Ps = 100 − Pb aggregate content, %; Gb gravity of the
 * binder; Gmm maximum, Gmb bulk specific gravity of the mix; Gsb bulk, Gsa apparent, Gse effective specific
 * gravity of the aggregate; gravities have no unit. Percentages are 4.5, not 0.045.
 * Source of all, unless another is named: AASHTO R 35, Superpave Volumetric Design for Asphalt Mixtures,
 * calculation sections; from memory, verify. Every gravity must be above zero and Pb between 0 and 100.
 * Impossible results (negative voids, effective below bulk gravity) are values here: they are for the
 * consistency checks to show.
 */

/**
 * Effective specific gravity of the aggregate. Gse = Ps/(100/Gmm − Pb/Gb).
 *
 * Domain: 100/Gmm above Pb/Gb, else the binder alone would fill the mix.
 *
 * @example effectiveGravity({ Pb: 5.5, Gb: 1.03, Gmm: 2.47 }) // 2.68878
 */
export function effectiveGravity({ Pb, Gb, Gmm }: { Pb: number; Gb: number; Gmm: number }): NumericResult {
  const fault = contentFault(Pb) ?? unusable({ Gb, Gmm }, 'positive');
  if (fault) return cannot(fault);
  const aggregateVolume = 100 / Gmm - Pb / Gb;
  if (aggregateVolume <= 0) return cannot('Gmm and Pb leave no volume for the aggregate');
  return known((100 - Pb) / aggregateVolume);
}

/**
 * Maximum specific gravity at another binder content. Gmm = 100/(Ps/Gse + Pb/Gb).
 *
 * @example maximumGravityAt({ Pb: 6, Gb: 1.05, Gse: 2.7172 }) // 2.4809
 */
export function maximumGravityAt({ Pb, Gb, Gse }: { Pb: number; Gb: number; Gse: number }): NumericResult {
  const fault = contentFault(Pb) ?? unusable({ Gb, Gse }, 'positive');
  return fault ? cannot(fault) : known(100 / ((100 - Pb) / Gse + Pb / Gb));
}

/**
 * Absorbed binder, % of aggregate by mass. Pba = 100·Gb·(Gse − Gsb)/(Gse·Gsb).
 *
 * Negative where Gse is below Gsb, which cannot be and is shown as such.
 *
 * @example absorbedBinder({ Gb: 1.05, Gse: 2.7172, Gsb: 2.683 }) // 0.4926 %
 */
export function absorbedBinder({ Gb, Gse, Gsb }: { Gb: number; Gse: number; Gsb: number }): NumericResult {
  const fault = unusable({ Gb, Gse, Gsb }, 'positive');
  return fault ? cannot(fault) : known((100 * Gb * (Gse - Gsb)) / (Gse * Gsb));
}

/**
 * Effective binder content, % of mix by mass. Pbe = Pb − Pba·Ps/100.
 *
 * Pba is % of aggregate, hence the factor Ps/100.
 *
 * @example effectiveBinderContent({ Pb: 5.3, Pba: 0.8051 }) // 4.5376 %
 */
export function effectiveBinderContent({ Pb, Pba }: { Pb: number; Pba: number }): NumericResult {
  const fault = contentFault(Pb) ?? unusable({ Pba });
  return fault ? cannot(fault) : known(Pb - (Pba * (100 - Pb)) / 100);
}

/**
 * Air voids, % of mix by volume. Va = 100·(Gmm − Gmb)/Gmm.
 *
 * Source also: AASHTO T 269. Negative where Gmb is above Gmm.
 *
 * @example airVoids({ Gmm: 2.535, Gmb: 2.442 }) // 3.669 %
 */
export function airVoids({ Gmm, Gmb }: { Gmm: number; Gmb: number }): NumericResult {
  const fault = unusable({ Gmm, Gmb }, 'positive');
  return fault ? cannot(fault) : known((100 * (Gmm - Gmb)) / Gmm);
}

/**
 * Voids in the mineral aggregate, % of mix by volume. VMA = 100 − Gmb·Ps/Gsb.
 *
 * With the bulk gravity of the aggregate: apparent or effective gravity gives another property.
 *
 * @example voidsInMineralAggregate({ Gmb: 2.442, Pb: 5.3, Gsb: 2.70245 }) // 14.427 %
 */
export function voidsInMineralAggregate({
  Gmb,
  Pb,
  Gsb,
}: {
  Gmb: number;
  Pb: number;
  Gsb: number;
}): NumericResult {
  const fault = contentFault(Pb) ?? unusable({ Gmb, Gsb }, 'positive');
  return fault ? cannot(fault) : known(100 - (Gmb * (100 - Pb)) / Gsb);
}

/**
 * Voids filled with asphalt, % of VMA. VFA = 100·(VMA − Va)/VMA.
 *
 * Domain: VMA above zero.
 *
 * @example voidsFilledWithAsphalt({ VMA: 14.427, Va: 3.669 }) // 74.57 %
 */
export function voidsFilledWithAsphalt({ VMA, Va }: { VMA: number; Va: number }): NumericResult {
  const fault = unusable({ Va }) ?? unusable({ VMA }, 'positive');
  return fault ? cannot(fault) : known((100 * (VMA - Va)) / VMA);
}

/**
 * Effective binder, % of mix by volume. Vbe = Pbe·Gmb/Gb, which equals VMA − Va exactly.
 *
 * @example effectiveBinderVolume({ Pbe: 5.035, Gmb: 2.348, Gb: 1.05 }) // 11.259 %
 */
export function effectiveBinderVolume({
  Pbe,
  Gmb,
  Gb,
}: {
  Pbe: number;
  Gmb: number;
  Gb: number;
}): NumericResult {
  const fault = unusable({ Pbe }) ?? unusable({ Gmb, Gb }, 'positive');
  return fault ? cannot(fault) : known((Pbe * Gmb) / Gb);
}

/**
 * Dust proportion. DP = P0.075/Pbe.
 *
 * Symbols: P0.075 percent passing 0.075 mm, %; Pbe effective binder content, % of mix. Over effective, not total,
 * binder (AASHTO M 323; from memory, verify); agencies that divide by total binder mean another quantity.
 * Domain: P0.075 not below zero, Pbe above zero.
 *
 * @example dustProportion({ P0075: 5.5, Pbe: 3.9507 }) // 1.3922
 */
export function dustProportion({ P0075, Pbe }: { P0075: number; Pbe: number }): NumericResult {
  const fault = unusable({ P0075 }) ?? unusable({ Pbe }, 'positive');
  if (fault) return cannot(fault);
  return P0075 < 0 ? cannot('percent passing 0.075 mm is below zero') : known(P0075 / Pbe);
}

/**
 * Apparent film thickness, µm. TF = 1000·Pbe/(Gb·SA·Ps).
 *
 * Symbols: SA surface area of the aggregate, m²/kg. The factor by dimensions: 1 litre over (m²/kg · kg) is 1 mm.
 * A printed copy with the factor 100 is in circulation and is wrong by ten.
 * Source: Asphalt Institute MS-2 (1995); from memory, verify. Domain: Gb, SA above zero; Pb below 100.
 *
 * @example filmThickness({ Pbe: 4.6, Pb: 5.4, Gb: 1.03, SA: 5.9054 }) // 7.994 µm
 */
export function filmThickness({
  Pbe,
  Pb,
  Gb,
  SA,
}: {
  Pbe: number;
  Pb: number;
  Gb: number;
  SA: number;
}): NumericResult {
  const fault = contentFault(Pb) ?? unusable({ Pbe }) ?? unusable({ Gb, SA }, 'positive');
  return fault ? cannot(fault) : known((1000 * Pbe) / (Gb * SA * (100 - Pb)));
}

function contentFault(Pb: number): string | null {
  return Pb >= 0 && Pb < 100 ? null : 'Pb must be at least 0 and below 100';
}
