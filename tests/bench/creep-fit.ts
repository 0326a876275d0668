import { creepBandAt } from '#rules/calculations/creep-band';
import { sigmoidCompliance } from '#rules/calculations/creep-compliance';
import { fitCreep } from '#rules/calculations/creep-fit';
import { timingOf, told } from './measure';

/** A sigmoid through 11 points with its band at each of them, over a thousand synthetic problems with a seed. */
export function benchCreepFit(): string {
  const problems = syntheticProblems(PROBLEMS);
  const times: number[] = [];
  let converged = 0;
  for (const [place, points] of [...problems.slice(0, WARM_UPS), ...problems].entries()) {
    const start = performance.now();
    const result = fitCreep('sigmoid', points);
    if (result.ok) for (const { t } of points) creepBandAt(result.fit, t, 0.95);
    const taken = performance.now() - start;
    if (place < WARM_UPS) continue;
    times.push(taken);
    if (result.ok && result.fit.converged) converged += 1;
  }
  return `creep fit, 11 points, with band: ${told(timingOf(times))}, target at most 1 ms; ${converged} of ${PROBLEMS} converge`;
}

const PROBLEMS = 1000;
const WARM_UPS = 500;

function syntheticProblems(count: number): { t: number; D: number }[][] {
  let state = 20260301;
  const uniform = () => {
    state = (state * 1664525 + 1013904223) % 4294967296;
    return (state + 0.5) / 4294967296;
  };
  const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
  return Array.from({ length: count }, () => {
    const D0 = 0.02 * 10 ** uniform();
    const Dinf = D0 * 10 ** (0.5 + 1.5 * uniform());
    const parameters = { D0, Dinf, tau: 10 ** (5 * uniform()), n: 0.2 + 0.8 * uniform() };
    const noise = 0.03 * uniform();
    return Array.from({ length: 11 }, (_, i) => {
      const t = 10 ** (0.3 * i);
      const exact = sigmoidCompliance(parameters, t);
      return { t, D: (exact.ok ? exact.value : 1) * Math.exp(noise * normal()) };
    });
  });
}
