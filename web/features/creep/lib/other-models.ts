import type { CreepCurveView, CreepFitView } from '#shared/contracts/creep';
import { formatPlain, groupThousands } from '#shared/format/numbers';
import { curveAt } from './curve-at';

const names = { sigmoid: 'sigmoid', power: 'power law', prony: 'Prony series' };

/** What the other models give where a rule asks: "The power law has R² 0.990 and gives 0.231 at 1,000 s." */
export function otherModelWords({ fits, findings }: CreepCurveView, shown: CreepFitView): string[] {
  const asked = findings.filter(({ source }) => source === 'fitted' || source === 'extrapolated');
  const time = asked.at(-1)?.time ?? null;
  return fits
    .filter(({ model }) => model !== shown.model)
    .map((fit) => {
      const quality = `The ${names[fit.model]} has R² ${fit.rSquared.toFixed(3)}`;
      if (fit.rejected !== null) return `${quality} and is rejected.`;
      const there = time === null ? null : curveAt(fit.samples, time);
      if (there === null || time === null) return `${quality}.`;
      return `${quality} and gives ${formatPlain(there.estimate, 3)} at ${groupThousands(formatPlain(time))} s.`;
    });
}
