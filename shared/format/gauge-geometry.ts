import type { Outcome } from '#rules/engine/finding';
import { formatFixed } from './numbers';

export const gaugeHeight = 34;
/** Where the limits always stand, so that the eye runs down one lane. */
const minimumPlace = 0.25;
const maximumPlace = 0.75;
const pinnedInsidePx = 6;

export interface GaugeInput {
  min: number | null;
  max: number | null;
  target?: number | null;
  decimals: number;
  /** The limit's unit; only months are written, for the age of a document. */
  unit: string;
  /** Half the width of a one-sided gauge, in the quantity's unit; in decades on a logarithmic scale. */
  span: number;
  scale: 'linear' | 'log';
  outcome: Outcome;
  /** The rounded value, the one that was judged; null where there is none. */
  value: number | null;
  /** ± the precision that decides *borderline*. */
  precision: number | null;
  /** What the workbook itself reports. */
  reported?: number | null;
  /** The last tested value behind an extrapolated one. */
  testedTo?: number | null;
  /** Limits of another edition. */
  otherLimits?: readonly number[];
  widthPx: number;
}

export type DotShape = 'disc' | 'square' | 'half diamond';

export interface GaugeGeometry {
  widthPx: number;
  lane: { x: number; width: number };
  ticks: { x: number; figure: string }[];
  otherTicks: number[];
  targetX: number | null;
  decades: { x: number; long: boolean }[];
  whisker: { from: number; to: number } | null;
  dot: { x: number; shape: DotShape; pinned: 'left' | 'right' | null } | null;
  reportedX: number | null;
  beyond: { from: number; to: number } | null;
}

/** Where everything of a limit gauge stands; null where no limit is a number. */
export function gaugeGeometry(input: GaugeInput): GaugeGeometry | null {
  const place = placing(input);
  if (!place) return null;
  const { widthPx, min, max, value } = input;
  const from = min === null ? 0 : place(min);
  const to = max === null ? widthPx : place(max);
  const raw = value === null ? null : place(value);
  const reported = input.reported ?? null;
  const testedTo = input.testedTo ?? null;
  return {
    widthPx,
    lane: { x: from, width: tenth(Math.max(0, to - from)) },
    ticks: [min, max].flatMap((limit) =>
      limit === null ? [] : [{ x: place(limit), figure: figureOf(limit, input) }],
    ),
    otherTicks: (input.otherLimits ?? []).map(place).filter((x) => x >= 0 && x <= widthPx),
    targetX: input.target == null ? null : place(input.target),
    decades: input.scale === 'log' ? decadeTicks(input, place) : [],
    whisker: whiskerOf(input, place),
    dot: raw === null ? null : { ...pin(raw, widthPx), shape: shapeOf(input.outcome) },
    reportedX: reported === null ? null : Math.min(widthPx, Math.max(0, place(reported))),
    beyond:
      testedTo === null || raw === null
        ? null
        : { from: Math.min(widthPx, Math.max(0, place(testedTo))), to: pin(raw, widthPx).x },
  };
}

function placing(input: GaugeInput): ((value: number) => number) | null {
  const along = input.scale === 'log' ? (value: number) => Math.log10(value) : (value: number) => value;
  const span = input.span > 0 ? input.span : 1;
  const { widthPx } = input;
  const min = input.min === null ? null : along(input.min);
  const max = input.max === null ? null : along(input.max);
  const half = maximumPlace - minimumPlace;
  const at = (share: number) => (Number.isFinite(share) ? tenth(share * widthPx) : 0);
  if (min !== null && max !== null) {
    if (max > min) return (value) => at(minimumPlace + (half * (along(value) - min)) / (max - min));
    return (value) => at(0.5 + (half * (along(value) - min)) / span);
  }
  if (min !== null) return (value) => at(minimumPlace + (half * (along(value) - min)) / span);
  if (max !== null) return (value) => at(maximumPlace + (half * (along(value) - max)) / span);
  return null;
}

/** Drawn to a tenth of a pixel: a whisker that reaches the limit by its numbers reaches the tick on the page. */
function tenth(x: number): number {
  return Math.round(x * 10) / 10;
}

function figureOf(limit: number, input: GaugeInput): string {
  const figure = formatFixed(limit, input.decimals);
  return input.unit === 'months' || input.unit === 'month' ? `${figure} months` : figure;
}

function whiskerOf(input: GaugeInput, place: (value: number) => number): GaugeGeometry['whisker'] {
  const { value, precision, widthPx } = input;
  if (value === null || precision === null || precision <= 0) return null;
  const from = input.scale === 'log' && value - precision <= 0 ? 0 : place(value - precision);
  const to = place(value + precision);
  if (to < 0 || from > widthPx) return null;
  return { from: Math.max(0, from), to: Math.min(widthPx, to) };
}

function pin(x: number, widthPx: number): { x: number; pinned: 'left' | 'right' | null } {
  if (x < 0) return { x: pinnedInsidePx, pinned: 'left' };
  if (x > widthPx) return { x: widthPx - pinnedInsidePx, pinned: 'right' };
  return { x, pinned: null };
}

function shapeOf(outcome: Outcome): DotShape {
  if (outcome === 'pass') return 'disc';
  return outcome === 'fail' ? 'square' : 'half diamond';
}

function decadeTicks(input: GaugeInput, place: (value: number) => number): GaugeGeometry['decades'] {
  const reference = input.min ?? input.max;
  if (reference === null || reference <= 0) return [];
  const start = Math.floor(Math.log10(reference)) - 3;
  const ticks: GaugeGeometry['decades'] = [];
  for (let decade = start; decade <= start + 7; decade += 1) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const x = place(digit * 10 ** decade);
      if (x > 0 && x < input.widthPx) ticks.push({ x, long: digit === 1 });
    }
  }
  return ticks;
}
