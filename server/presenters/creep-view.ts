import { creepBandAt } from '#rules/calculations/creep-band';
import { creepSamples } from '#rules/calculations/creep-samples';
import type { CreepAnalysis, CreepCurve, CreepMasterCurve, DescribedFit } from '#rules/engine/creep-analysis';
import type { Evidence, Finding } from '#rules/engine/finding';
import { convert } from '#rules/quantities/units';
import type { CreepComplianceMeasure } from '#rules/rule-sets/measure';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { CreepCurveView, CreepFindingView, CreepFitView, CreepView } from '#shared/contracts/creep';

/** The creep tests of a check with their curves as points to draw, and the findings that stand on each. */
export function creepView(input: {
  creep: CreepAnalysis;
  findings: readonly Finding[];
  rules: ResolvedEdition['rules'];
}): Pick<CreepView, 'curves' | 'master' | 'others'> {
  const curves = input.creep.filter((entry): entry is CreepCurve => entry.kind === 'curve');
  const master = input.creep.find((entry): entry is CreepMasterCurve => entry.kind === 'master-curve');
  const judged = creepFindings(input.findings, input.rules);
  const placed = new Map(judged.map((each) => [each, curveOf(each, curves)]));
  return {
    curves: curves.map((curve) =>
      presentCurve(
        curve,
        judged.filter((each) => placed.get(each) === curve),
      ),
    ),
    master: master === undefined ? null : presentMaster(master),
    others: judged.filter((each) => placed.get(each) === null).map((each) => presentFinding(each, null)),
  };
}

interface JudgedCreep {
  finding: Finding;
  measure: CreepComplianceMeasure;
}

function creepFindings(findings: readonly Finding[], rules: ResolvedEdition['rules']): JudgedCreep[] {
  const measures = new Map(rules.map(({ id, measure }) => [id, measure]));
  return findings.flatMap((finding) => {
    const measure = measures.get(finding.rule);
    return measure?.kind === 'creep-compliance' ? [{ finding, measure }] : [];
  });
}

/** The entry of the rule's own stress where there is one, else the one of all levels at its temperature. */
function curveOf({ measure }: JudgedCreep, curves: readonly CreepCurve[]): CreepCurve | null {
  const { temperature, stress } = measure;
  const near = curves.filter(
    (curve) => curve.temperature !== null && Math.abs(curve.temperature - temperature) <= 0.5,
  );
  const whole = near.find((curve) => curve.stress === null) ?? near[0] ?? null;
  if (stress === undefined) return whole;
  return near.find((curve) => curve.stress === stress) ?? null;
}

function presentCurve(curve: CreepCurve, judged: readonly JudgedCreep[]): CreepCurveView {
  const { kind: _kind, fits, ...rest } = curve;
  const range = rangeOf(
    curve.points.map(({ time }) => time),
    judged.map(({ measure }) => measure.time),
  );
  return {
    ...rest,
    fits: range === null ? [] : fits.map((fit) => presentFit(fit, range)),
    findings: judged.map((each) => presentFinding(each, curve)),
  };
}

function presentMaster(master: CreepMasterCurve): CreepView['master'] {
  const { kind: _kind, fit, ...rest } = master;
  return { ...rest, fit: presentFit(fit, { from: fit.window.from / 3, to: fit.window.to * 10 }) };
}

interface Range {
  from: number;
  to: number;
}

/** A decade beyond the tests, and some room around the times that rules ask for. */
function rangeOf(tested: readonly number[], asked: readonly number[]): Range | null {
  if (tested.length === 0) return null;
  return {
    from: Math.min(...tested, ...asked) / 2.2,
    to: Math.max(Math.max(...tested) * 10, ...asked.map((time) => time * 12)),
  };
}

const SAMPLES = 81;
const DRAWN_CONFIDENCE = 0.95;

function presentFit(fit: DescribedFit, range: Range): CreepFitView {
  const {
    lnParameters: _ln,
    covariance: _covariance,
    covarianceFactor: _factor,
    residuals: _residuals,
    lnCentre: _centre,
    ...rest
  } = fit;
  return { ...rest, samples: creepSamples(fit, { ...range, count: SAMPLES, confidence: DRAWN_CONFIDENCE }) };
}

function presentFinding({ finding, measure }: JudgedCreep, curve: CreepCurve | null): CreepFindingView {
  const { temperature, time, stress, model, confidence } = measure;
  const unit = finding.limit?.unit ?? OWN_UNIT;
  const judged = finding.observed === null ? null : (finding.evidence[0] ?? null);
  const fit = curve?.fits.find((each) => each.model === model);
  const band = fit && fit.rejected === null ? creepBandAt(fit, time, confidence) : null;
  return {
    finding,
    temperature,
    time,
    stress: stress ?? null,
    model,
    min: inOwnUnit(finding.limit?.min ?? null, unit),
    max: inOwnUnit(finding.limit?.max ?? null, unit),
    source: judged === null ? null : sourceOf(judged),
    estimate: judged === null ? null : estimateOf(judged),
    band: band?.ok ? { lower: band.band.lower, upper: band.band.upper } : null,
    confidence,
  };
}

const OWN_UNIT = '1/GPa';

function inOwnUnit(value: number | null, unit: string): number | null {
  const converted = value === null ? null : convert(value, unit, OWN_UNIT);
  return converted?.ok ? converted.value : null;
}

/** What was computed from readings is measured in the reader's words; a fit and a report say so. */
function sourceOf({ origin, inputs = [] }: Evidence): string {
  if (origin === 'fitted' || origin === 'extrapolated') return origin;
  const isReported =
    origin === 'reported' || (inputs.length > 0 && inputs.every((each) => each.origin === 'reported'));
  return isReported ? 'reported' : 'measured';
}

/** Of a bound the estimate that it bounds: its first input is the curve itself. */
function estimateOf(judged: Evidence): number | null {
  const [first] = judged.inputs ?? [];
  const isBound =
    first?.formula !== undefined && first.origin === judged.origin && first.quantity === judged.quantity;
  const isFitted = judged.origin === 'fitted' || judged.origin === 'extrapolated';
  return isFitted && isBound ? first.value : judged.value;
}
