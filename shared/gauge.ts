import type { Finding } from '#rules/engine/finding';
import { decimalsOf, formatFixed, groupThousands } from './format/numbers';

/** Where the parts of a limit gauge stand, in px of a drawing `width` wide and 34 high. */
export interface GaugeGeometry {
  width: number;
  lane: { x: number; width: number } | null;
  ticks: { x: number; text: string }[];
  /** Dotted ticks: the same limits in another edition. */
  otherTicks: number[];
  /** Thin centre line at a target. */
  middle: number | null;
  decades: { x: number; long: boolean }[];
  whisker: { from: number; to: number } | null;
  dot: { x: number; shape: 'disc' | 'square' | 'diamond'; offScale: 'left' | 'right' | null } | null;
  /** Open wedge above the line: what the workbook reports. */
  reported: number | null;
  /** Dashed from the last tested value to an extrapolated one. */
  beyond: { from: number; to: number } | null;
  words: { x: number; text: string; observed: boolean }[];
}

type Gauged = Pick<Finding, 'outcome' | 'limit' | 'observed' | 'precision' | 'gauge' | 'evidence'>;

const firstStop = 0.25;
const lastStop = 0.75;
const edgePx = 6;

/** Null where a gauge says nothing: not applicable, no limit, no scale. */
export function gaugeGeometry(
  finding: Gauged,
  width = 208,
  otherLimits: readonly number[] = [],
): GaugeGeometry | null {
  const { limit } = finding;
  if (finding.outcome === 'not applicable' || limit === null) return null;
  if (limit.oneOf !== null) return categorical(finding, limit.oneOf, width);
  const scale = scaleOf(finding, width);
  if (scale === null) return null;
  const value = finding.observed?.rounded ?? null;
  const dot = value === null ? null : dotOf(value, finding.outcome, scale.x, width);
  return {
    width,
    lane: laneOf(limit.min, limit.max, scale.x, width),
    ticks: [limit.min, limit.max].flatMap((at) =>
      at === null ? [] : [{ x: scale.x(at), text: figureOf(at, limit) }],
    ),
    otherTicks: otherLimits.map(scale.x).filter((x) => x >= 0 && x <= width),
    middle: limit.target === null ? null : scale.x(limit.target),
    decades: scale.decades,
    whisker: value === null ? null : whiskerOf(value, finding.precision?.value ?? null, scale.x, width),
    dot,
    reported: reportedOf(finding, scale.x, width),
    beyond: beyondOf(finding, scale.x, width, dot),
    words: [],
  };
}

interface Scale {
  x: (value: number) => number;
  decades: GaugeGeometry['decades'];
}

/** Two limits stand at 25 and 75 % of the width; one alone has half the width for the quantity's span. */
function scaleOf({ limit, gauge }: Gauged, width: number): Scale | null {
  if (limit === null) return null;
  const log = gauge?.scale === 'log';
  const forward = log ? Math.log10 : (value: number) => value;
  const low = limit.min;
  const high = limit.max;
  let origin: { at: number; x: number };
  let perUnit: number;
  if (low !== null && high !== null && high > low) {
    origin = { at: forward(low), x: firstStop * width };
    perUnit = ((lastStop - firstStop) * width) / (forward(high) - forward(low));
  } else if (low !== null || high !== null) {
    if (gauge === null || gauge.span <= 0) return null;
    origin =
      low === null
        ? { at: forward(high ?? 0), x: lastStop * width }
        : { at: forward(low), x: firstStop * width };
    perUnit = width / 2 / gauge.span;
  } else {
    return null;
  }
  if (!Number.isFinite(origin.at) || !Number.isFinite(perUnit)) return null;
  const x = (value: number) => origin.x + (forward(value) - origin.at) * perUnit;
  return {
    x,
    decades: log
      ? decadeTicks(x, origin.at + (0 - origin.x) / perUnit, origin.at + (width - origin.x) / perUnit)
      : [],
  };
}

function decadeTicks(
  x: (value: number) => number,
  fromExponent: number,
  toExponent: number,
): GaugeGeometry['decades'] {
  const ticks: GaugeGeometry['decades'] = [];
  for (let exponent = Math.floor(fromExponent); exponent <= Math.ceil(toExponent); exponent += 1) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const exponentHere = exponent + Math.log10(digit);
      if (exponentHere < fromExponent || exponentHere > toExponent) continue;
      ticks.push({ x: x(10 ** exponentHere), long: digit === 1 });
    }
  }
  return ticks;
}

function laneOf(min: number | null, max: number | null, x: Scale['x'], width: number): GaugeGeometry['lane'] {
  const from = min === null ? 0 : x(min);
  const to = max === null ? width : x(max);
  return { x: from, width: Math.max(0, to - from) };
}

function whiskerOf(
  value: number,
  precision: number | null,
  x: Scale['x'],
  width: number,
): GaugeGeometry['whisker'] {
  if (precision === null) return null;
  const from = clip(x(value - precision), width);
  const to = clip(x(value + precision), width);
  return from < to ? { from, to } : null;
}

function clip(x: number, width: number): number {
  return Number.isFinite(x) ? Math.min(width, Math.max(0, x)) : 0;
}

function dotOf(
  value: number,
  outcome: Gauged['outcome'],
  x: Scale['x'],
  width: number,
): GaugeGeometry['dot'] {
  if (outcome === 'not shown') return null;
  const at = x(value);
  const shape = outcome === 'fail' ? 'square' : outcome === 'undecided' ? 'diamond' : 'disc';
  if (at > width - edgePx) return { x: width - edgePx, shape, offScale: 'right' };
  if (!(at >= edgePx)) return { x: edgePx, shape, offScale: 'left' };
  return { x: at, shape, offScale: null };
}

function reportedOf({ evidence, observed }: Gauged, x: Scale['x'], width: number): number | null {
  const judged = evidence.find((item) => item.reported !== undefined);
  if (judged?.reported === undefined || observed === null) return null;
  // The wedge stands only where the judged value does not round to what the workbook writes.
  const halfDigit = 0.5 * 10 ** -decimalsOf(judged.reported.text);
  if (Math.abs(judged.reported.value - (judged.value ?? Number.NaN)) <= halfDigit * 1.000001) return null;
  const at = x(judged.reported.value);
  return at >= 0 && at <= width ? at : null;
}

function beyondOf(
  { evidence }: Gauged,
  x: Scale['x'],
  width: number,
  dot: GaugeGeometry['dot'],
): GaugeGeometry['beyond'] {
  const judged = evidence[0];
  if (judged?.origin !== 'extrapolated' || dot === null) return null;
  const tested = judged.inputs?.findLast((input) => input.quantity === judged.quantity)?.value ?? null;
  return tested === null ? null : { from: clip(x(tested), width), to: dot.x };
}

const mostWords = 4;
/** Mean advance of an 11 px figure at 86 % width, with a gap; words that would touch are not drawn side by side. */
const wordPxPerCharacter = 6;

function categorical(finding: Gauged, allowed: string[], width: number): GaugeGeometry | null {
  const observed = finding.observed?.text ?? null;
  const lane = { x: 0.145 * width, width: 0.71 * width };
  const isAllowed = finding.outcome !== 'fail';
  const words: GaugeGeometry['words'] = [];
  const widest = Math.max(...allowed.map((word) => word.length)) * wordPxPerCharacter;
  if (allowed.length > mostWords || widest * allowed.length > width) {
    words.push({
      x: width / 2,
      text: `${observed ?? ''} one of ${allowed.length}`.trim(),
      observed: isAllowed && observed !== null,
    });
  } else {
    allowed.forEach((text, index) => {
      const x = lane.x + (lane.width * (index + 0.5)) / allowed.length;
      words.push({ x, text, observed: isAllowed && observed === text });
    });
  }
  const place = words.find((word) => word.observed);
  const dot =
    observed === null || finding.outcome === 'not shown'
      ? null
      : {
          x: place?.x ?? (isAllowed ? width / 2 : width - edgePx),
          shape: isAllowed
            ? finding.outcome === 'undecided'
              ? ('diamond' as const)
              : ('disc' as const)
            : ('square' as const),
          offScale: null,
        };
  return {
    width,
    lane,
    ticks: [],
    otherTicks: [],
    middle: null,
    decades: [],
    whisker: null,
    dot,
    reported: null,
    beyond: null,
    words,
  };
}

/** The limit in its own decimals and without its unit; only the age of a document says what it counts. */
function figureOf(at: number, { decimals, unit }: { decimals: number; unit: string }): string {
  const figure = groupThousands(formatFixed(at, decimals));
  return unit === 'months' ? `${figure} months` : figure;
}
