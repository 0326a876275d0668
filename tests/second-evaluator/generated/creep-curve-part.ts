import type { RuleInput } from '#rules/rule-sets/schema';
import type { Draw } from './draw';
import { emptyPart, type Part } from './parts';

type Model = 'sigmoid' | 'power' | 'prony';

const TIMES = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];
const STRESS = 200;

/**
 * A test of many loading times whose points lie on a curve of the four-parameter form, a power law or a Prony series,
 * on it exactly, nearly or not at all; the limit is far from the curve, so that any fit that deserves the name agrees.
 */
export function creepCurvePart(draw: Draw, id: string): Part {
  const part = emptyPart();
  const model = draw.oneOf(['sigmoid', 'prony', 'power'] as const);
  const scatter = draw.weighed([
    [45, 0],
    [35, 0.003],
    [20, 0.5],
  ]);
  const time = draw.oneOf([30, 3, 70, 300, 700, 100, 20, 5000]);
  const min = draw.whole(10, 30) / 100;
  const max = 2 * min;
  const wanted = draw.oneOf([0.75 * min, 1.4 * min, 1.35 * max, 1.4 * min]);
  const shape = shapeOf(draw, model);
  const scale = wanted / shape(Math.min(time, 1000));
  const limit = draw.oneOf<RuleInput['limit']>([{ min, max }, { min }, { max }, { min, max }]);
  part.rules.push({
    id,
    clause: '7',
    title: 'Creep compliance by a curve',
    severity: 'required',
    measure: {
      kind: 'creep-compliance',
      temperature: -10,
      time,
      source: draw.oneOf(['fitted', 'either'] as const),
      model,
    },
    limit,
    ...(draw.chance(50) ? { rounding: { method: 'rounding', to: 0.001 } } : {}),
  });
  if (draw.chance(6)) return part;
  const isStrain = draw.chance(40);
  const specimens = draw.whole(2, 3);
  // Too few loading times for any of the curves.
  const times = draw.chance(8) ? TIMES.slice(0, 2) : TIMES;
  for (let specimen = 1; specimen <= specimens; specimen += 1) {
    for (const tested of times) {
      // Specimens lie on either side of the curve, so that some scatter is in every loading time.
      const side = (specimen % 2 === 0 ? 1 : -1) * (0.8 + draw.whole(0, 40) / 100);
      const compliance = scale * shape(tested) * Math.exp(side * scatter);
      part.readings.push({
        quantity: isStrain ? 'creep-strain' : 'creep-compliance',
        value: Number((isStrain ? compliance * STRESS : compliance).toPrecision(12)),
        unit: isStrain ? 'µε' : '1/GPa',
        at: { trial: 'design', temperature: -10, stress: STRESS, time: tested, specimen: String(specimen) },
        origin: 'measured',
      });
    }
  }
  return part;
}

/** Compliance by loading time, up to a factor. */
function shapeOf(draw: Draw, model: Model): (time: number) => number {
  if (model === 'power') {
    const exponent = draw.whole(25, 60) / 100;
    const start = draw.whole(5, 20) / 10;
    return (time) => start + time ** exponent;
  }
  if (model === 'sigmoid') {
    const tau = draw.oneOf([30, 100, 300, 1000]);
    const slope = draw.whole(50, 90) / 100;
    const end = draw.whole(8, 40);
    return (time) => end + (1 - end) / (1 + (time / tau) ** slope);
  }
  const terms = [1, 10, 100, 1000].map((tau) => ({ tau, growth: draw.whole(5, 20) / 10 }));
  return (time) => terms.reduce((sum, { tau, growth }) => sum + growth * (1 - Math.exp(-time / tau)), 1);
}
