/**
 * What a mistake may have been made of, by trade symbol. A value that the workbook does not give is `NaN`, so
 * that a cause which needs it comes to `NaN` too and drops out.
 */
export interface CauseInputs {
  /** The value as it ought to be. */
  own: number;
  Pb: number;
  Gb: number;
  Gmm: number;
  Gmb: number;
  Gsb: number;
  Gsa: number;
  Gse: number;
  Pba: number;
  Pbe: number;
  Va: number;
  VMA: number;
  P0075: number;
  SA: number;
  /** Arithmetic mean of the stockpiles' bulk gravities, by share. */
  GsbArithmetic: number;
  GsaArithmetic: number;
  /** Unweighted mean of the stockpiles' absorptions. */
  absorptionUnweighted: number;
  /** Va and VMA with the decimals that the workbook shows them with. */
  VaShown: number;
  VMAShown: number;
  PbeShown: number;
  /** Gravities of the mix with the decimals that the workbook shows them with. */
  GmmShown: number;
  GmbShown: number;
  /** Air voids as the mean of each specimen's own Gmb and Gmm. */
  VaOfRatios: number;
  S1: number;
  S2: number;
  /** Mean of the conditioned over the dry strengths, specimen by specimen. */
  ratioOfPairs: number;
  /** Recycled material and recycled binder, % of mix. */
  recycledContent: number;
  recycledBinder: number;
  A: number;
  B: number;
  C: number;
  hRef: number;
  hN: number;
  /** Relative density with the ratio of heights turned round. */
  densityTurnedRound: number;
  P: number;
  t: number;
  D: number;
}

/** A mistake and what it makes of the inputs; `NaN` where one of them is missing. */
export interface Cause {
  id: string;
  /** Completes "The workbook …". */
  text: string;
  compute(inputs: CauseInputs): number;
}

const arithmetic = {
  id: 'arithmetic-for-harmonic-mean',
  text: 'combines the stockpile gravities by the arithmetic, not the harmonic, mean',
};
const gseForGsb = {
  id: 'effective-for-bulk-gravity',
  text: 'uses the effective, not the bulk, gravity of the aggregate',
};
const withoutPs = {
  id: 'aggregate-share-left-out',
  text: 'takes absorbed binder by mass of mix, not of aggregate',
};

const roundedGravities = {
  id: 'rounded-gravities',
  text: 'rounds the gravities of the mix before it calculates',
};

const absorbed = (c: CauseInputs, Gsb: number) => (100 * c.Gb * (c.Gse - Gsb)) / (c.Gse * Gsb);
const effective = (c: CauseInputs, Pba: number) => c.Pb - (Pba * (100 - c.Pb)) / 100;
const effectiveArithmetic = (c: CauseInputs) => effective(c, absorbed(c, c.GsbArithmetic));
const voids = (c: CauseInputs, Gsb: number) => 100 - (c.Gmb * (100 - c.Pb)) / Gsb;
const filled = (c: CauseInputs, VMA: number) => (100 * (VMA - c.Va)) / VMA;
const film = (c: CauseInputs, Pbe: number) => (1000 * Pbe) / (c.Gb * c.SA * (100 - c.Pb));

/** Known mistakes by the quantity they spoil. No two of one quantity are the same formula in another guise. */
export const causes: Readonly<Record<string, Cause[]>> = {
  'bulk-specific-gravity-aggregate': [{ ...arithmetic, compute: (c) => c.GsbArithmetic }],
  'apparent-specific-gravity-aggregate': [{ ...arithmetic, compute: (c) => c.GsaArithmetic }],
  'water-absorption': [
    {
      id: 'shares-left-out',
      text: 'averages the stockpiles without their shares',
      compute: (c) => c.absorptionUnweighted,
    },
  ],
  'bulk-specific-gravity-mix': [
    {
      id: 'dry-for-surface-dry-mass',
      text: 'uses the dry, not the surface-dry, mass for the volume',
      compute: (c) => c.A / (c.A - c.C),
    },
    {
      id: 'surface-dry-for-dry-mass',
      text: 'divides the surface-dry, not the dry, mass by the volume',
      compute: (c) => c.B / (c.B - c.C),
    },
  ],
  'effective-specific-gravity-aggregate': [
    {
      id: 'binder-gravity-left-out',
      text: 'leaves the gravity of the binder out',
      compute: (c) => (100 - c.Pb) / (100 / c.Gmm - c.Pb),
    },
    {
      id: 'bulk-for-maximum-gravity',
      text: 'uses the bulk, not the maximum, gravity of the mix',
      compute: (c) => (100 - c.Pb) / (100 / c.Gmb - c.Pb / c.Gb),
    },
  ],
  'absorbed-binder': [
    { ...arithmetic, compute: (c) => absorbed(c, c.GsbArithmetic) },
    {
      id: 'absorbed-by-mass-of-mix',
      text: 'states absorbed binder by mass of mix, not of aggregate',
      compute: (c) => (c.Pba * (100 - c.Pb)) / 100,
    },
    {
      id: 'binder-gravity-left-out',
      text: 'leaves the gravity of the binder out',
      compute: (c) => c.Pba / c.Gb,
    },
  ],
  'effective-binder-content': [
    { ...arithmetic, compute: effectiveArithmetic },
    { ...withoutPs, compute: (c) => c.Pb - c.Pba },
    {
      id: 'total-for-effective-binder',
      text: 'states total, not effective, binder',
      compute: (c) => c.Pb,
    },
  ],
  'air-voids': [
    {
      id: 'voids-over-bulk-gravity',
      text: 'divides by the bulk, not the maximum, gravity of the mix',
      compute: (c) => (100 * (c.Gmm - c.Gmb)) / c.Gmb,
    },
    {
      ...roundedGravities,
      compute: (c) => (100 * (c.GmmShown - c.GmbShown)) / c.GmmShown,
    },
    {
      id: 'mean-of-ratios',
      text: 'averages the air voids of pairs of Gmb and Gmm, not the gravities',
      compute: (c) => c.VaOfRatios,
    },
    {
      id: 'relative-density-for-voids',
      text: 'states relative density, not air voids',
      compute: (c) => (100 * c.Gmb) / c.Gmm,
    },
  ],
  'voids-in-mineral-aggregate': [
    { ...arithmetic, compute: (c) => voids(c, c.GsbArithmetic) },
    { ...gseForGsb, compute: (c) => voids(c, c.Gse) },
    {
      id: 'apparent-for-bulk-gravity',
      text: 'uses the apparent, not the bulk, gravity of the aggregate',
      compute: (c) => voids(c, c.Gsa),
    },
    {
      id: 'aggregate-content-left-out',
      text: 'leaves the aggregate content Ps out',
      compute: (c) => 100 - (100 * c.Gmb) / c.Gsb,
    },
    {
      id: 'binder-by-mass-of-aggregate',
      text: 'takes the binder content by mass of aggregate, not of mix',
      compute: (c) => 100 - (c.Gmb * (10000 / (100 + c.Pb))) / c.Gsb,
    },
    { ...roundedGravities, compute: (c) => 100 - (c.GmbShown * (100 - c.Pb)) / c.Gsb },
    {
      id: 'maximum-for-bulk-gravity',
      text: 'uses the maximum, not the bulk, gravity of the mix',
      compute: (c) => 100 - (c.Gmm * (100 - c.Pb)) / c.Gsb,
    },
    {
      id: 'air-voids-for-vma',
      text: 'states air voids, not voids in the mineral aggregate',
      compute: (c) => (100 * (c.Gmm - c.Gmb)) / c.Gmm,
    },
  ],
  'voids-filled-with-asphalt': [
    {
      id: 'rounded-voids',
      text: 'rounds VMA and air voids before it divides',
      compute: (c) => (100 * (c.VMAShown - c.VaShown)) / c.VMAShown,
    },
    { ...arithmetic, compute: (c) => filled(c, voids(c, c.GsbArithmetic)) },
    { ...gseForGsb, compute: (c) => filled(c, voids(c, c.Gse)) },
    {
      id: 'aggregate-content-left-out',
      text: 'leaves the aggregate content Ps out of VMA',
      compute: (c) => filled(c, 100 - (100 * c.Gmb) / c.Gsb),
    },
    {
      id: 'total-for-effective-binder',
      text: 'uses total, not effective, binder',
      compute: (c) => (100 * c.Pb * c.Gmb) / (c.Gb * c.VMA),
    },
    {
      id: 'unfilled-for-filled',
      text: 'states the unfilled, not the filled, part of the voids',
      compute: (c) => (100 * c.Va) / c.VMA,
    },
  ],
  'effective-binder-volume': [
    {
      id: 'total-for-effective-binder',
      text: 'uses total, not effective, binder',
      compute: (c) => (c.Pb * c.Gmb) / c.Gb,
    },
    {
      id: 'rounded-voids',
      text: 'takes rounded air voids from rounded VMA',
      compute: (c) => c.VMAShown - c.VaShown,
    },
    { ...arithmetic, compute: (c) => (effectiveArithmetic(c) * c.Gmb) / c.Gb },
    { ...withoutPs, compute: (c) => ((c.Pb - c.Pba) * c.Gmb) / c.Gb },
    {
      id: 'binder-gravity-left-out',
      text: 'leaves the gravity of the binder out',
      compute: (c) => c.Pbe * c.Gmb,
    },
  ],
  'dust-proportion': [
    {
      id: 'rounded-effective-binder',
      text: 'rounds effective binder before it divides',
      compute: (c) => c.P0075 / c.PbeShown,
    },
    {
      id: 'dust-over-total-binder',
      text: 'divides by total, not effective, binder',
      compute: (c) => c.P0075 / c.Pb,
    },
    { ...arithmetic, compute: (c) => c.P0075 / effectiveArithmetic(c) },
    { ...withoutPs, compute: (c) => c.P0075 / (c.Pb - c.Pba) },
    {
      id: 'binder-over-dust',
      text: 'divides binder by dust, not dust by binder',
      compute: (c) => c.Pbe / c.P0075,
    },
  ],
  'film-thickness': [
    {
      id: 'total-for-effective-binder',
      text: 'uses total, not effective, binder',
      compute: (c) => film(c, c.Pb),
    },
    { ...arithmetic, compute: (c) => film(c, effectiveArithmetic(c)) },
    {
      id: 'mix-for-aggregate-mass',
      text: 'spreads the binder over the mass of mix, not of aggregate',
      compute: (c) => (10 * c.Pbe) / (c.Gb * c.SA),
    },
  ],
  'relative-density': [
    {
      id: 'heights-left-out',
      text: 'leaves the heights out',
      compute: (c) => (c.hN === c.hRef ? Number.NaN : (100 * c.Gmb) / c.Gmm),
    },
    {
      id: 'heights-turned-round',
      text: 'turns the ratio of heights round',
      compute: (c) => c.densityTurnedRound,
    },
  ],
  'tensile-strength-dry': strengthCauses(),
  'tensile-strength-conditioned': strengthCauses(),
  'tensile-strength-ratio': [
    {
      id: 'dry-over-conditioned',
      text: 'divides the dry by the conditioned strength',
      compute: (c) => (100 * c.S1) / c.S2,
    },
    {
      id: 'mean-of-ratios',
      text: 'averages the ratios of pairs, not the strengths',
      compute: (c) => c.ratioOfPairs,
    },
  ],
  'recycled-binder-ratio': [
    {
      id: 'recycled-by-mass-of-aggregate',
      text: 'takes the recycled content by mass of aggregate, not of mix',
      compute: (c) => (c.recycledBinder * (100 - c.Pb)) / (100 * c.Pb),
    },
    {
      id: 'recycled-content-for-ratio',
      text: 'states the recycled content of the mix, not its share of the binder',
      compute: (c) => c.recycledContent / 100,
    },
    {
      id: 'over-virgin-binder',
      text: 'divides by virgin, not total, binder',
      compute: (c) => c.recycledBinder / (c.Pb - c.recycledBinder),
    },
  ],
};

function strengthCauses(): Cause[] {
  return [
    {
      id: 'factor-two-left-out',
      text: 'leaves the factor 2 out',
      compute: (c) => (1e6 * c.P) / (Math.PI * c.t * c.D),
    },
    { id: 'pi-left-out', text: 'leaves π out', compute: (c) => (2e6 * c.P) / (c.t * c.D) },
  ];
}
