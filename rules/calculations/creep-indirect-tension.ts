import { mean, trimmedMean } from '../numerics/mean';
import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';
import { squared } from '../numerics/transcendental';

/** One face of a specimen: its deformation in mm, and thickness b mm, diameter D mm and load P kN of its specimen. */
export interface FaceDeformation {
  deformation: number;
  b: number;
  D: number;
  P: number;
}

/**
 * Trimmed mean of the deformations of all faces, mm, each normalised to the mean specimen:
 * ΔXn = ΔX·(b/b̄)·(D/D̄)·(P̄/P), then the mean without the highest and the lowest.
 *
 * Symbols: b thickness, D diameter, mm; P load, kN; a bar over a symbol its mean over the faces given.
 * Source: AASHTO T 322-07, calculations; from memory, verify. Domain: at least six faces (three specimens, two faces
 * each; for fewer the method defines nothing), dimensions and loads above zero. Of equal extremes one is dropped.
 *
 * @example trimmedDeformation of six equal specimens with 4.12, 3.88, 4.05, 4.31, 3.99, 4.02 µm // 4.045 µm
 */
export function trimmedDeformation(faces: readonly FaceDeformation[]): NumericResult {
  const fault = facesFault(faces);
  if (fault) return cannot(fault);
  const averages = averagesOf(faces);
  return trimmedMean(
    faces.map(
      ({ deformation, b, D, P }) => deformation * (b / averages.b) * (D / averages.D) * (averages.P / P),
    ),
  );
}

/**
 * Trimmed mean of the ratio of horizontal to vertical deformation over all faces, X/Y, taken at half the total time.
 *
 * Source: AASHTO T 322-07, calculations; from memory, verify. Domain: at least six faces, each with a horizontal
 * and a vertical deformation that is not zero; the sign of neither matters.
 *
 * @example trimmedRatio of six faces with horizontal 4 and vertical 9.5 µm // 0.421053
 */
export function trimmedRatio(faces: readonly { horizontal: number; vertical: number }[]): NumericResult {
  if (faces.length < LEAST_FACES) return cannot(fewFaces(faces.length));
  if (faces.some(({ horizontal, vertical }) => !Number.isFinite(horizontal) || !(Math.abs(vertical) > 0))) {
    return cannot('a vertical deformation is zero or missing');
  }
  return trimmedMean(faces.map(({ horizontal, vertical }) => Math.abs(horizontal / vertical)));
}

/**
 * Correction factor of indirect tension. C = 0.6354·(X/Y)⁻¹ − 0.332, within
 * 0.704 − 0.213·(b/D) ≤ C ≤ 1.566 − 0.195·(b/D).
 *
 * Symbols: X/Y ratio of horizontal to vertical deformation; b thickness, D diameter, mm.
 * Source: AASHTO T 322-07, calculations; from memory, verify. Domain: all above zero; outside its limits the method
 * does not hold and there is none.
 *
 * @example correctionFactor({ ratio: 0.42105, b: 50, D: 150 }) // 1.17708, between 0.633 and 1.501
 */
export function correctionFactor({ ratio, b, D }: { ratio: number; b: number; D: number }): NumericResult {
  const fault = unusable({ 'X/Y': ratio, b, D }, 'positive');
  if (fault) return cannot(fault);
  const C = 0.6354 / ratio - 0.332;
  const { least, most } = correctionLimits({ b, D });
  if (C < least || C > most) return cannot('the correction factor lies outside the limits of the method');
  return known(C);
}

/** The limits of the correction factor: 0.704 − 0.213·(b/D) and 1.566 − 0.195·(b/D); source as `correctionFactor`. */
export function correctionLimits({ b, D }: { b: number; D: number }): { least: number; most: number } {
  return { least: 0.704 - 0.213 * (b / D), most: 1.566 - 0.195 * (b / D) };
}

/**
 * Poisson's ratio in indirect tension. ν = −0.10 + 1.480·(X/Y)² − 0.778·(b/D)²·(X/Y)², kept within 0.05 and 0.50.
 *
 * Source: AASHTO T 322-07, calculations; from memory, verify. Domain: all above zero.
 *
 * @example poissonRatio({ ratio: 0.42105, b: 50, D: 150 }) // 0.1471
 */
export function poissonRatio({ ratio, b, D }: { ratio: number; b: number; D: number }): NumericResult {
  const fault = unusable({ 'X/Y': ratio, b, D }, 'positive');
  if (fault) return cannot(fault);
  const value = -0.1 + 1.48 * squared(ratio) - 0.778 * squared(b / D) * squared(ratio);
  return known(Math.min(0.5, Math.max(0.05, value)));
}

/** ΔX trimmed mean deformation mm, D diameter mm, b thickness mm, P load kN, GL gauge length mm, C correction factor. */
export interface IndirectTensionInputs {
  dX: number;
  D: number;
  b: number;
  P: number;
  GL: number;
  C: number;
}

/**
 * Creep compliance from indirect tension, 1/GPa. D(t) = ΔX·D·b/(P·GL)·C.
 *
 * Symbols as in the inputs, D and b and P the means over the specimens. mm³/(kN·mm) is mm²/kN, which is 1/GPa
 * exactly, so no factor is needed.
 * Source: AASHTO T 322-07, calculations; from memory, verify. Domain: finite ΔX, all else above zero.
 *
 * @example indirectTensionCompliance({ dX: 0.004, D: 150, b: 50, P: 10, GL: 38, C: 1.17708 }) // 0.092928 1/GPa
 */
export function indirectTensionCompliance({ dX, D, b, P, GL, C }: IndirectTensionInputs): NumericResult {
  const fault = unusable({ ΔX: dX }) ?? unusable({ D, b, P, GL, C }, 'positive');
  return fault ? cannot(fault) : known(((dX * D * b) / (P * GL)) * C);
}

/**
 * Load that puts the centre of a disc under a horizontal stress, kN. P = σ·π·b·D/2.
 *
 * Symbols: σ stress, kPa; b thickness, D diameter, mm; kPa·mm² is 10⁻⁶ kN.
 * Source: indirect tension, as in the tensile strength test; AASHTO T 322-07; from memory, verify. Domain: all above
 * zero.
 *
 * @example loadFromStress({ stress: 400, b: 50, D: 150 }) // 4.71239 kN
 */
export function loadFromStress({ stress, b, D }: { stress: number; b: number; D: number }): NumericResult {
  const fault = unusable({ σ: stress, b, D }, 'positive');
  return fault ? cannot(fault) : known((stress * Math.PI * b * D) / 2e6);
}

export const LEAST_FACES = 6;

export function fewFaces(count: number): string {
  return `the trimmed mean needs six faces, three specimens with two each, and there ${count === 1 ? 'is' : 'are'} ${count}`;
}

function facesFault(faces: readonly FaceDeformation[]): string | null {
  if (faces.length < LEAST_FACES) return fewFaces(faces.length);
  for (const { deformation, b, D, P } of faces) {
    const fault = unusable({ ΔX: deformation }) ?? unusable({ b, D, P }, 'positive');
    if (fault) return fault;
  }
  return null;
}

function averagesOf(faces: readonly FaceDeformation[]): { b: number; D: number; P: number } {
  const average = (values: number[]) => {
    const result = mean(values);
    return result.ok ? result.value : Number.NaN;
  };
  return {
    b: average(faces.map(({ b }) => b)),
    D: average(faces.map(({ D }) => D)),
    P: average(faces.map(({ P }) => P)),
  };
}
