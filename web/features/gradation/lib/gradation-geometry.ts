import { scaleLinear, scalePow } from 'd3-scale';
import { line } from 'd3-shape';
import type { GradationPoint } from '#shared/contracts/checks';
import { formatPlain } from '#shared/format/numbers';

/** Exponent of the chart on which the densest gradation is a straight line (Fuller's curve as FHWA uses it). */
const powerExponent = 0.45;

export interface ChartSize {
  widthPx: number;
  heightPx: number;
}

export interface PlacedPoint {
  point: GradationPoint;
  x: number;
  y: number;
  fails: boolean;
}

export interface GradationGeometry {
  frame: { left: number; right: number; top: number; bottom: number };
  percents: { percent: number; y: number; isLabelled: boolean }[];
  sieves: { sieve: number; x: number; label: string | null }[];
  /** Control points: a lane bar between its ticks, open-ended ones run to the frame. */
  controls: {
    x: number;
    from: number;
    to: number;
    ticks: { y: number; label: string; labelX: number; anchor: 'start' | 'middle' | 'end'; labelY: number }[];
  }[];
  maximumDensity: { x1: number; y1: number; x2: number; y2: number } | null;
  blend: string;
  points: PlacedPoint[];
}

/** Labels of neighbouring sieves keep at least so far apart; a sieve without a label keeps its grid line. */
const labelRoomPx = 36;

export function gradationGeometry(
  points: readonly GradationPoint[],
  maximumSizeMm: number | null,
  { widthPx, heightPx }: ChartSize,
): GradationGeometry {
  const frame = { left: 40, right: widthPx - 14, top: 14, bottom: heightPx - 40 };
  const sorted = [...points].sort((one, other) => other.sieve - one.sieve);
  const largest = Math.max(maximumSizeMm ?? 0, ...sorted.map((point) => point.sieve), 1);
  const x = scalePow().exponent(powerExponent).domain([0, largest]).range([frame.left, frame.right]);
  const y = scaleLinear().domain([0, 100]).range([frame.bottom, frame.top]);
  const placed = sorted.map((point) => ({
    point,
    x: x(point.sieve),
    y: y(point.passing),
    fails: point.outcome === 'fail',
  }));
  return {
    frame,
    percents: Array.from({ length: 11 }, (_, index) => ({
      percent: index * 10,
      y: y(index * 10),
      isLabelled: index % 2 === 0,
    })),
    sieves: labelled(sorted.map((point) => ({ sieve: point.sieve, x: x(point.sieve) }))),
    controls: sorted
      .filter((point) => point.min !== null || point.max !== null)
      .map((point) => controlOf(point, x(point.sieve), y, frame)),
    maximumDensity: maximumSizeMm === null ? null : { x1: x(0), y1: y(0), x2: x(maximumSizeMm), y2: y(100) },
    blend:
      line<PlacedPoint>()
        .x((each) => each.x)
        .y((each) => each.y)(placed) ?? '',
    points: placed,
  };
}

function controlOf(
  point: GradationPoint,
  x: number,
  y: (percent: number) => number,
  frame: GradationGeometry['frame'],
): GradationGeometry['controls'][number] {
  const low = point.min === null ? frame.bottom : y(point.min);
  const high = point.max === null ? frame.top : y(point.max);
  const side = x > frame.right - 60 ? ('end' as const) : ('start' as const);
  const labelX = side === 'end' ? x - 13 : x + 13;
  const narrow = low - high < 30;
  const ticks = [
    point.max === null
      ? null
      : {
          y: high,
          label: formatPlain(point.max),
          ...(narrow
            ? { labelX: x, anchor: 'middle' as const, labelY: high - 7 }
            : { labelX, anchor: side, labelY: high + 4 }),
        },
    point.min === null
      ? null
      : {
          y: low,
          label: formatPlain(point.min),
          ...(narrow
            ? { labelX: x - 13, anchor: 'end' as const, labelY: low + 4 }
            : { labelX, anchor: side, labelY: low + 4 }),
        },
  ];
  // What every mix meets, nothing and all, is the frame itself and needs no figure.
  const named = ticks.filter((tick) => tick !== null && tick.label !== '100' && tick.label !== '0');
  return { x, from: high, to: low, ticks: named.filter((tick) => tick !== null) };
}

function labelled(sieves: readonly { sieve: number; x: number }[]): GradationGeometry['sieves'] {
  let last = Number.POSITIVE_INFINITY;
  const smallest = sieves[sieves.length - 1];
  return sieves.map(({ sieve, x }) => {
    const roomToLast = last - x >= labelRoomPx;
    const roomToSmallest =
      smallest === undefined || smallest.sieve === sieve || x - smallest.x >= labelRoomPx;
    const label = roomToLast && roomToSmallest ? formatPlain(sieve) : null;
    if (label !== null) last = x;
    return { sieve, x, label };
  });
}
