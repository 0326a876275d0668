import type { MasterCurveView } from '#shared/contracts/creep';

type MasterPoint = MasterCurveView['points'][number] & {
  /** t/aT, the time at the reference temperature, s. */
  reducedTime: number;
};

/** Each point of a master curve at its time at the reference temperature. */
export function shiftedPoints({ points, shifts }: Pick<MasterCurveView, 'points' | 'shifts'>): MasterPoint[] {
  const logs = new Map(shifts.map(({ temperature, logShift }) => [temperature, logShift]));
  return points.map((point) => ({
    ...point,
    reducedTime: point.time * 10 ** -(logs.get(point.temperature ?? Number.NaN) ?? 0),
  }));
}
