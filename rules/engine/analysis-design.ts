import Decimal from 'decimal.js';
import { designBinderContent, isQuadratic, propertyAt, type TrialPoint } from '../calculations/design-point';
import { quantityById } from '../quantities/registry';
import type { AnalysisOptions, DesignPoint, TestedContent } from './analysis';
import { designTrial } from './analysis-index';
import { type AnalysisNode, derivedNode } from './analysis-node';

/** A trial with its binder content and every value computed from its own raw readings. */
export interface TrialValues {
  trial: string;
  pb: AnalysisNode | null;
  nodes: AnalysisNode[];
}

/** How far a trial's binder content may lie from the declared one to stand for the design, %. */
const sameContentPercent = 0.05;

/** Smooth in binder content, so that a fit over trials means something. */
export const fittedQuantities: ReadonlySet<string> = new Set([
  'effective-specific-gravity-aggregate',
  'absorbed-binder',
  'effective-binder-content',
  'air-voids',
  'voids-in-mineral-aggregate',
  'voids-filled-with-asphalt',
  'effective-binder-volume',
  'dust-proportion',
  'film-thickness',
]);

export function designPointOf(
  trials: TrialValues[],
  declared: AnalysisNode | null,
  options: AnalysisOptions,
): { point: DesignPoint; computed: AnalysisNode | null } {
  const { targetAirVoids, fit } = options;
  const voids = pointsOf(trials, 'air-voids');
  const method = isQuadratic(
    voids.map(({ pb }) => pb.value),
    fit,
  )
    ? 'quadratic'
    : 'linear';
  const computed = derivedNode({
    quantity: 'design-binder-content',
    at: { trial: designTrial },
    formula: `Pb where the ${method} fit of Va is ${targetAirVoids}`,
    inputs: voids.flatMap(({ pb, node }) => [pb, node]),
    compute: (values) => designBinderContent(trialPoints(values), targetAirVoids, fit),
    origin: 'interpolated',
  });
  const point: DesignPoint = {
    declaredBinderContent: declared?.value ?? null,
    computedBinderContent: computed?.value ?? null,
    targetAirVoids,
    fit: method,
    trial: declared === null ? null : (trialAt(trials, declared)?.trial ?? null),
  };
  return { point, computed };
}

/**
 * Values of the design that its own raw readings do not give: from the trial at the declared binder content, else
 * by a fit over the trials at that content, never beyond them.
 */
export function designFromTrials(
  trials: TrialValues[],
  declared: AnalysisNode | null,
  own: AnalysisNode[],
  options: AnalysisOptions,
): AnalysisNode[] {
  if (declared === null) return [];
  const had = new Set(own.map(slotOf));
  const trial = trialAt(trials, declared);
  if (trial) {
    const missing = trial.nodes.filter((node) => isDerived(node) && !had.has(slotOf(node)));
    return missing.map(asDesign);
  }
  return [...fittedQuantities].flatMap((quantity) => {
    const missing = !own.some((node) => node.quantity === quantity);
    return missing ? (fitted(trials, quantity, declared, options) ?? []) : [];
  });
}

/**
 * Where values at another binder content can be read from. The design counts where it was compacted itself at a
 * content that no trial stands for; else its readings would weigh twice.
 */
export function testedContents(trials: TrialValues[], design: TrialValues): TestedContent[] {
  const ownDesign = design.pb !== null && trialAt(trials, design.pb) === null ? [design] : [];
  return [...trials, ...ownDesign]
    .flatMap(({ trial, pb, nodes }): TestedContent[] => {
      const values = nodes.filter((node) => fittedQuantities.has(node.quantity) && isPlain(node));
      return pb === null || values.length === 0 ? [] : [{ trial, binderContent: pb, values }];
    })
    .toSorted((a, b) => a.binderContent.value - b.binderContent.value);
}

function fitted(
  trials: TrialValues[],
  quantity: string,
  declared: AnalysisNode,
  { fit }: AnalysisOptions,
): AnalysisNode | null {
  const points = pointsOf(trials, quantity);
  if (points.length < 2) return null;
  const contents = points.map(({ pb }) => pb.value);
  const symbol = points[0]!.node.symbol;
  const formula = isQuadratic(contents, fit)
    ? `least squares of ${symbol} = a + b·Pb + c·Pb² over ${points.length} trials`
    : `${symbol} on the line between the neighbouring trials`;
  const node = derivedNode({
    quantity,
    at: { trial: designTrial },
    formula,
    inputs: [declared, ...points.flatMap(({ pb, node }) => [pb, node])],
    compute: ([Pb, ...values]) => propertyAt(trialPoints(values), Pb!, fit),
    origin: 'interpolated',
  });
  return node && { ...node, count: Math.min(...points.map((point) => point.node.count ?? 1)) };
}

function pointsOf(trials: TrialValues[], quantity: string): { pb: AnalysisNode; node: AnalysisNode }[] {
  return trials.flatMap(({ pb, nodes }) => {
    const node = nodes.find((other) => other.quantity === quantity && isPlain(other));
    return pb && node ? [{ pb, node }] : [];
  });
}

function trialPoints(values: number[]): TrialPoint[] {
  const points: TrialPoint[] = [];
  for (let place = 0; place + 1 < values.length; place += 2) {
    points.push({ Pb: values[place]!, value: values[place + 1]! });
  }
  return points;
}

/** The nearest of the trials within the allowance, which is included; decimals, because 5.35 − 5.3 is not 0.05. */
function trialAt(trials: TrialValues[], declared: AnalysisNode): TrialValues | null {
  let best: TrialValues | null = null;
  let least = new Decimal(sameContentPercent);
  for (const trial of trials) {
    if (trial.pb === null) continue;
    const distance = new Decimal(trial.pb.value).minus(declared.value).abs();
    if (distance.lessThan(least) || (best === null && distance.equals(least))) {
      best = trial;
      least = distance;
    }
  }
  return best;
}

function asDesign(node: AnalysisNode): AnalysisNode {
  return {
    ...node,
    at: { ...node.at, trial: designTrial },
    specimens: node.specimens.map((specimen) => ({
      ...specimen,
      at: { ...specimen.at, trial: designTrial },
      reported: null,
    })),
    reported: null,
  };
}

/** A measured quantity is never another trial's. */
function isDerived(node: AnalysisNode): boolean {
  return node.formula !== null && quantityById(node.quantity)?.kind === 'derived';
}

function isPlain({ at }: AnalysisNode): boolean {
  return Object.keys(at).every((key) => key === 'trial' || key === 'gyrations' || key === 'blend');
}

function slotOf({ quantity, at }: AnalysisNode): string {
  return JSON.stringify([quantity, { ...at, trial: undefined }]);
}
