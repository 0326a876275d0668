import { z } from 'zod';
import type { CreepAnalysis, CreepCurve, DescribedFit } from '#rules/engine/creep-analysis';
import { formatPlain, formatSigned, groupThousands } from '#shared/format/numbers';

/** The creep tests of a check as a document carries them: the figures of the screen, as words and points. */
export const creepWordsSchema = z.strictObject({
  /** One a temperature and stress: "at −10 °C under 400 kPa". */
  curves: z.array(z.strictObject({ title: z.string(), lines: z.array(z.string()) })),
  points: z.array(
    z.strictObject({
      temperature: z.number().nullable(),
      stress: z.number().nullable(),
      specimen: z.string(),
      time: z.number(),
      value: z.number(),
      cell: z.string(),
    }),
  ),
  /** Shift factors and what is said about the master curve. */
  master: z.array(z.string()),
});

export type CreepWords = z.infer<typeof creepWordsSchema>;

/** Null where there are no creep tests. */
export function creepWords(creep: CreepAnalysis): CreepWords | null {
  const curves = creep.filter((entry): entry is CreepCurve => entry.kind === 'curve');
  if (curves.length === 0) return null;
  const master = creep.find((entry) => entry.kind === 'master-curve');
  // A curve of one level of stress repeats the points of the one of all levels.
  const whole = curves.filter(
    (curve, i) => curves.findIndex((other) => other.temperature === curve.temperature) === i,
  );
  return {
    curves: curves.map((curve) => ({
      title: titleOf(curve),
      lines: [
        ...curve.fits.flatMap((fit) => [fitLine(fit), ...fit.words]),
        ...curve.remarks.map(({ text }) => `${text}.`),
        ...curve.problems,
      ],
    })),
    points: whole.flatMap(({ points }) =>
      points.map(({ temperature, stress, specimen, time, value, source }) => ({
        temperature,
        stress,
        specimen: specimen ?? '',
        time,
        value,
        cell: source === null ? '' : `${source.sheet} ${source.cell}`.trim(),
      })),
    ),
    master:
      master === undefined
        ? []
        : [
            `Master curve at ${formatPlain(master.referenceTemperature)} °C, for information: no rule is judged by it. ${fitLine(master.fit)}`,
            ...master.shifts.map(
              ({ temperature, logShift, low, high }) =>
                `log aT at ${formatPlain(temperature)} °C: ${
                  temperature === master.referenceTemperature
                    ? 'reference'
                    : `${formatSigned(logShift, 2)}${low === null || high === null ? ', not held' : ` (${formatSigned(low, 2)} to ${formatSigned(high, 2)})`}`
                }`,
            ),
            ...master.fit.words,
            ...master.problems,
          ],
  };
}

function titleOf({ temperature, stress, stresses }: CreepCurve): string {
  const at =
    temperature === null ? 'at a temperature that is not stated' : `at ${formatPlain(temperature)} °C`;
  const levels = stress === null ? stresses : [stress];
  return levels.length === 0
    ? at
    : `${at} under ${levels.map((each) => formatPlain(each)).join(' and ')} kPa`;
}

const models = { sigmoid: 'Sigmoid', power: 'Power law', prony: 'Prony series' };

/** "Sigmoid: D0 0.0422 1/GPa (0.037 to 0.049); …; R² 0.992, 44 points" */
function fitLine({ model, parameters, rSquared, pointCount }: DescribedFit): string {
  const values = parameters.map(({ symbol, value, unit, low, high }) => {
    const interval = low === null || high === null ? 'no bound' : `${figure(low, 2)} to ${figure(high, 2)}`;
    return `${symbol} ${figure(value, 3)}${unit === '1' ? '' : ` ${unit}`} (${interval})`;
  });
  return `${models[model]}: ${values.join('; ')}; R² ${rSquared.toFixed(3)}, ${pointCount} points`;
}

function figure(value: number, digits: number): string {
  return groupThousands(formatPlain(value, digits));
}
