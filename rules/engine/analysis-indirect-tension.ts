import {
  correctionFactor,
  type FaceDeformation,
  fewFaces,
  indirectTensionCompliance,
  LEAST_FACES,
  loadFromStress,
  trimmedDeformation,
  trimmedRatio,
} from '../calculations/creep-indirect-tension';
import type { Reading } from '../record';
import { capitalised } from '../rule-sets/words';
import { type CreepFailure, type CreepNodes, stressNode } from './analysis-creep';
import { type RecordIndex, specialConditions, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/**
 * Creep compliance from indirect tension (AASHTO T 322; from memory, verify): per set of test conditions one value a
 * loading time, the trimmed mean over specimens and faces. A face is a specimen with the form that its reading names.
 */
export function indirectTensionOf(index: RecordIndex, trial: string): CreepNodes {
  const sets = new Map<string, Reading[]>();
  for (const reading of index.ofTrial('horizontal-deformation', trial)) {
    const { temperature, stress, aging } = reading.at;
    const key = [temperature, stress, aging].join('|');
    sets.set(key, [...(sets.get(key) ?? []), reading]);
  }
  const nodes: AnalysisNode[] = [];
  const failures: CreepFailure[] = [];
  for (const horizontal of sets.values()) {
    const result = seriesOf(index, trial, horizontal);
    if (result.ok) nodes.push(...result.nodes);
    else {
      const { temperature, stress, aging } = horizontal[0]!.at;
      const at = withoutGaps({ trial, temperature, stress, aging });
      failures.push({ quantity: 'horizontal-deformation', at, reason: result.reason });
    }
  }
  return { nodes, failures };
}

/** A face with everything that normalises its deformation. */
interface Face {
  specimen: string | undefined;
  variant: string | undefined;
  thickness: AnalysisNode;
  diameter: AnalysisNode;
  load: AnalysisNode;
}

type Series = { ok: true; nodes: AnalysisNode[] } | { ok: false; reason: string };

function seriesOf(index: RecordIndex, trial: string, horizontal: Reading[]): Series {
  const times = [...new Set(horizontal.flatMap(({ at }) => at.time ?? []))].toSorted((a, b) => a - b);
  if (times.length === 0) return refused('Readings of horizontal deformation do not say the loading time');
  const faces = facesOf(index, trial, horizontal);
  if (!faces.ok) return faces;
  const length = gaugeLength(index, trial, faces.faces);
  if (!length.ok) return length;
  const ratio = ratioNode(index, trial, { horizontal, faces: faces.faces, times });
  if (!ratio.ok) return ratio;
  const b = averageOf(faces.faces.map(({ thickness }) => thickness));
  const D = averageOf(faces.faces.map(({ diameter }) => diameter));
  const P = averageOf(faces.faces.map(({ load }) => load));
  const C = derivedNode({
    quantity: 'correction-factor',
    symbol: 'C',
    at: {},
    formula: '0.6354·(X/Y)⁻¹ − 0.332',
    inputs: [ratio.node, b, D],
    compute: ([x, thickness, diameter]) => correctionFactor({ ratio: x!, b: thickness!, D: diameter! }),
  });
  if (C === null) return refused('The correction factor lies outside the limits of the method');
  const common = { b, D, P, C, length: length.node, faces: faces.faces };
  const nodes = times.flatMap((time) => complianceAt(trial, horizontal, time, common) ?? []);
  return nodes.length > 0 ? { ok: true, nodes } : refused('No loading time has a deformation of every face');
}

function complianceAt(
  trial: string,
  horizontal: Reading[],
  time: number,
  common: {
    b: AnalysisNode;
    D: AnalysisNode;
    P: AnalysisNode;
    C: AnalysisNode;
    length: AnalysisNode;
    faces: Face[];
  },
): AnalysisNode | null {
  const { b, D, P, C, length, faces } = common;
  const readings = faces.map((face) => ofFace(horizontal, face, time));
  const known = readings.filter((reading) => reading !== null);
  if (known.length < faces.length) return null;
  const dX = derivedNode({
    quantity: 'horizontal-deformation',
    symbol: 'ΔX',
    at: { time },
    formula: 'trimmed mean of ΔX·(b/b̄)·(D/D̄)·(P̄/P)',
    inputs: [
      ...known.map((reading) => readingNode(reading)),
      ...faces.flatMap(({ thickness, diameter, load }) => [thickness, diameter, load]),
    ],
    compute: (values) => trimmedDeformation(normalisedFaces(values, faces.length)),
  });
  if (dX === null) return null;
  const { temperature, stress, aging } = specialConditions(known[0]!);
  const node = derivedNode({
    quantity: 'creep-compliance',
    at: withoutGaps({ trial, temperature, stress, aging, time }),
    formula: 'ΔX·D·b/(P·GL)·C',
    inputs: [dX, D, b, P, length, C],
    // Deformations are kept in µm and the formula wants mm.
    compute: ([deformation, diameter, thickness, load, gauge, factor]) =>
      indirectTensionCompliance({
        dX: deformation! / 1000,
        D: diameter!,
        b: thickness!,
        P: load!,
        GL: gauge!,
        C: factor!,
      }),
  });
  return node === null ? null : { ...node, count: specimenCount(faces) };
}

function normalisedFaces(values: number[], count: number): FaceDeformation[] {
  return Array.from({ length: count }, (_, i) => ({
    deformation: values[i]!,
    b: values[count + 3 * i]!,
    D: values[count + 3 * i + 1]!,
    P: values[count + 3 * i + 2]!,
  }));
}

/** Every face that any loading time has, with the dimensions and the load of its specimen. */
function facesOf(
  index: RecordIndex,
  trial: string,
  horizontal: Reading[],
): { ok: true; faces: Face[] } | { ok: false; reason: string } {
  const byKey = new Map<string, Reading>();
  for (const reading of horizontal) {
    byKey.set(`${reading.at.specimen ?? ''}|${reading.at.variant ?? ''}`, reading);
  }
  if (byKey.size < LEAST_FACES) return refused(fewFaces(byKey.size));
  const faces: Face[] = [];
  for (const reading of byKey.values()) {
    const { specimen, variant, stress } = reading.at;
    const of = specimen === undefined ? '' : ` of specimen ${specimen}`;
    const thickness = dimensionOf(index, trial, 'specimen-thickness', specimen, 'b');
    if (thickness === null) return refused(`The thickness${of} is missing`);
    const diameter = dimensionOf(index, trial, 'specimen-diameter', specimen, 'D');
    if (diameter === null) return refused(`The diameter${of} is missing`);
    const load =
      loadReading(index, trial, reading) ??
      (stress === undefined ? null : loadNode(reading, stress, thickness, diameter));
    if (load === null) return refused(`Neither the creep load nor the stress${of} is known`);
    faces.push({ specimen, variant, thickness, diameter, load });
  }
  return { ok: true, faces };
}

/** The specimen's own value, else the one stated for all; several that differ are none. */
function dimensionOf(
  index: RecordIndex,
  trial: string,
  quantity: string,
  specimen: string | undefined,
  symbol: string,
): AnalysisNode | null {
  const readings = index.ofTrial(quantity, trial);
  const own = specimen === undefined ? [] : readings.filter(({ at }) => at.specimen === specimen);
  const chosen = own.length > 0 ? own : readings.filter(({ at }) => at.specimen === undefined);
  return onlyOne(chosen, symbol);
}

function loadReading(index: RecordIndex, trial: string, { at }: Reading): AnalysisNode | null {
  const readings = index
    .ofTrial('creep-load', trial)
    .filter(
      (load) =>
        (load.at.temperature === undefined || load.at.temperature === at.temperature) &&
        (load.at.specimen === undefined || load.at.specimen === at.specimen),
    );
  const own = readings.filter((load) => load.at.specimen !== undefined);
  return onlyOne(own.length > 0 ? own : readings, 'P');
}

function loadNode(
  reading: Reading,
  stress: number,
  thickness: AnalysisNode,
  diameter: AnalysisNode,
): AnalysisNode | null {
  return derivedNode({
    quantity: 'creep-load',
    symbol: 'P',
    at: {},
    formula: 'σ0·π·b·D/2',
    inputs: [stressNode(reading, stress), thickness, diameter],
    compute: ([applied, b, D]) => loadFromStress({ stress: applied!, b: b!, D: D! }),
  });
}

/** Stated, else the method's own for specimens of its usual diameter. */
function gaugeLength(
  index: RecordIndex,
  trial: string,
  faces: Face[],
): { ok: true; node: AnalysisNode } | { ok: false; reason: string } {
  const stated = onlyOne(index.ofTrial('gauge-length', trial), 'GL');
  if (stated !== null) return { ok: true, node: stated };
  const isUsual = faces.every(({ diameter }) => Math.abs(diameter.value - USUAL_DIAMETER_MM) <= 9);
  if (!isUsual) return refused('The gauge length is missing');
  const node: AnalysisNode = {
    ...faces[0]!.diameter,
    quantity: 'gauge-length',
    symbol: 'GL',
    at: {},
    value: USUAL_GAUGE_LENGTH_MM,
    origin: 'recomputed',
    formula: '38 mm for specimens of 150 ± 9 mm (AASHTO T 322; from memory, verify)',
    inputs: [],
    compute: null,
    reading: null,
  };
  return { ok: true, node };
}

const USUAL_DIAMETER_MM = 150;
const USUAL_GAUGE_LENGTH_MM = 38;

/** X/Y at half the total time, where the method takes it. */
function ratioNode(
  index: RecordIndex,
  trial: string,
  { horizontal, faces, times }: { horizontal: Reading[]; faces: Face[]; times: number[] },
): { ok: true; node: AnalysisNode } | { ok: false; reason: string } {
  const half = times.at(-1)! / 2;
  const time = times.find((each) => Math.abs(each - half) <= half * 0.01);
  const { temperature, stress, aging } = horizontal[0]!.at;
  const vertical = index
    .ofTrial('vertical-deformation', trial)
    .filter(({ at }) => at.temperature === temperature && at.stress === stress && at.aging === aging);
  if (vertical.length === 0) return refused('There is no reading of vertical deformation');
  if (time === undefined) return refused(`No deformation was read at ${half} s, half of the total time`);
  const pairs = faces.map((face) => [ofFace(horizontal, face, time), ofFace(vertical, face, time)] as const);
  const inputs = pairs.flatMap(([x, y]) => (x && y ? [readingNode(x), readingNode(y)] : []));
  if (inputs.length < 2 * faces.length) {
    return refused(`A face has no horizontal and vertical deformation at ${time} s, half of the total time`);
  }
  const node = derivedNode({
    quantity: 'deformation-ratio',
    symbol: 'X/Y',
    at: { time },
    formula: 'trimmed mean of ΔX/ΔY',
    inputs,
    compute: (values) =>
      trimmedRatio(faces.map((_, i) => ({ horizontal: values[2 * i]!, vertical: values[2 * i + 1]! }))),
  });
  return node === null ? refused('A vertical deformation is zero') : { ok: true, node };
}

function ofFace(readings: Reading[], face: Face, time: number): Reading | null {
  const own = readings.filter(
    ({ at }) => at.time === time && at.specimen === face.specimen && at.variant === face.variant,
  );
  return own.length > 0 && own.every(({ value }) => value === own[0]!.value) ? own[0]! : null;
}

function onlyOne(readings: Reading[], symbol: string): AnalysisNode | null {
  const [first] = readings;
  return first && readings.every(({ value }) => value === first.value) ? readingNode(first, symbol) : null;
}

/** Mean over the faces; a value that is stated for all of them stands as it is. */
function averageOf(nodes: AnalysisNode[]): AnalysisNode {
  const first = nodes[0]!;
  if (nodes.every(({ reading }) => reading !== null && reading === first.reading)) return first;
  return meanNode(nodes, {}, { keepSpecimens: false, counted: false }) ?? first;
}

function specimenCount(faces: Face[]): number {
  return new Set(faces.map(({ specimen }) => specimen)).size;
}

function refused(reason: string): { ok: false; reason: string } {
  return { ok: false, reason: `${capitalised(reason)}.` };
}
