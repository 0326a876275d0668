import type { CreepCurveView } from '#shared/contracts/creep';

type Place = Pick<CreepCurveView, 'temperature' | 'stress' | 'stresses' | 'findings'>;

/** The address of a curve within the page. */
export function curveKey({ temperature, stress, stresses }: Place): string {
  const search = new URLSearchParams();
  if (temperature !== null) search.set('temperature', String(temperature));
  // The curve of all levels of stress needs none, and nor does the one of the only level.
  if (stress !== null && stresses.length === 1) search.set('stress', String(stress));
  return search.toString();
}

/** The curve that the address names, else the first that a rule is not met on, else the first. */
export function chosenCurve<T extends Place>(curves: readonly T[], search: URLSearchParams): T | null {
  const temperature = search.get('temperature');
  const stress = search.get('stress');
  const at =
    temperature === null
      ? []
      : curves.filter(
          (curve) => curve.temperature !== null && Math.abs(curve.temperature - Number(temperature)) <= 0.5,
        );
  const named = at.find((curve) => stress !== null && curve.stress === Number(stress)) ?? at[0];
  const open = curves.find(({ findings }) => findings.some(({ finding }) => finding.outcome !== 'pass'));
  return named ?? open ?? curves[0] ?? null;
}
