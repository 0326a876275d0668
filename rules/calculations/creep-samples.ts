import { power } from '../numerics/transcendental';
import { type BandSource, type CreepBand, creepBandAt } from './creep-band';

export interface CreepSample extends CreepBand {
  /** s */
  time: number;
}

/**
 * A fitted curve with its band at times spread evenly in log t, both ends included, for drawing. A time at which the
 * curve has no number is left out.
 *
 * Source: `creepBandAt`. Domain: 0 < from < to, at least two samples.
 *
 * @example creepSamples(fit, { from: 1, to: 100, count: 3, confidence: 0.95 }) // at 1, 10 and 100 s
 */
export function creepSamples(
  fit: BandSource,
  { from, to, count, confidence }: { from: number; to: number; count: number; confidence: number },
): CreepSample[] {
  return Array.from({ length: count }, (_, i) => from * power(to / from, i / (count - 1))).flatMap((time) => {
    const band = creepBandAt(fit, time, confidence);
    return band.ok ? [{ time: Number(time.toPrecision(12)), ...band.band }] : [];
  });
}
