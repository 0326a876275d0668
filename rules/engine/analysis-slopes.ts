import type { NumericResult } from '../numerics/numeric-result';
import type { Reading } from '../record';
import { halfDisplayedUnit } from './analysis-digits';
import type { AnalysisNode } from './analysis-node';

/** Σ|∂f/∂x|·half a unit of the last displayed digit, over every reading behind the value. */
export function propagatedHalfUnits(node: AnalysisNode): number {
  let sum = 0;
  for (const [reading, slope] of gradientOf(node)) sum += Math.abs(slope) * halfDisplayedUnit(reading);
  return sum;
}

const gradients = new WeakMap<AnalysisNode, Map<Reading, number>>();

/** Slopes by reading, through all steps, so that what cancels between two steps cancels here too. */
function gradientOf(node: AnalysisNode): Map<Reading, number> {
  const known = gradients.get(node);
  if (known) return known;
  const gradient = new Map<Reading, number>();
  if (node.compute === null) {
    if (node.reading !== null) gradient.set(node.reading, 1);
  } else {
    const values = node.inputs.map((input) => input.value);
    node.inputs.forEach((input, index) => {
      const slope = slopeAt(node.compute!, values, index, node.value);
      if (slope === 0) return;
      for (const [reading, inner] of gradientOf(input)) {
        gradient.set(reading, (gradient.get(reading) ?? 0) + slope * inner);
      }
    });
  }
  gradients.set(node, gradient);
  return gradient;
}

/** Central difference; one-sided where the function ends beside the value. */
function slopeAt(
  compute: (values: number[]) => NumericResult,
  values: number[],
  index: number,
  here: number,
): number {
  const step = 1e-4 * Math.max(Math.abs(values[index]!), 1e-3);
  const above = compute(values.with(index, values[index]! + step));
  const below = compute(values.with(index, values[index]! - step));
  if (above.ok && below.ok) return (above.value - below.value) / (2 * step);
  if (above.ok) return (above.value - here) / step;
  return below.ok ? (here - below.value) / step : 0;
}
