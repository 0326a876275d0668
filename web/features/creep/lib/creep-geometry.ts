import { scaleLog } from 'd3-scale';
import type { CreepFindingView, CreepFitView, CreepSampleView } from '#shared/contracts/creep';
import { formatPlain, groupThousands } from '#shared/format/numbers';

export interface ChartSize {
  widthPx: number;
  heightPx: number;
}

/** A point to be placed: its own colour of nothing, its shape by specimen. */
export interface DrawnPoint {
  time: number;
  value: number;
  specimen: string | null;
}

export interface CreepGeometry {
  frame: { left: number; right: number; top: number; bottom: number };
  x(time: number): number;
  y(compliance: number): number;
  times: Tick[];
  compliances: Tick[];
  /** Tested times, and how far beyond them a rule asks. */
  tested: { from: number; to: number };
  beyond: { from: number; to: number; decades: number } | null;
  curve: { inside: string; outside: string; band: string } | null;
  asymptotes: {
    symbol: string;
    y: number;
    value: number;
    low: number | null;
    high: number | null;
    held: boolean;
  }[];
  flags: Flag[];
}

export interface Tick {
  at: number;
  /** Null between the labelled ones. */
  label: string | null;
}

/** A limit at a loading time: a tick, a lane towards what is allowed, and the value with its interval. */
export interface Flag {
  key: string;
  x: number;
  /** On a narrow drawing the label is empty: the clause leads to the table. */
  limits: { y: number; towards: 'up' | 'down'; label: string; labelX: number; anchor: 'start' | 'end' }[];
  value: { y: number; low: number | null; high: number | null } | null;
  view: CreepFindingView;
}

export interface CreepDrawing {
  points: readonly DrawnPoint[];
  fit: Pick<CreepFitView, 'samples' | 'parameters' | 'window' | 'model'> | null;
  findings: readonly CreepFindingView[];
  /** Times that the curve runs between; those of the samples where it has any. */
  size: ChartSize;
}

/** Both axes logarithmic, equal decades where the room allows; the band is cut at the frame, never the points. */
export function creepGeometry({ points, fit, findings, size }: CreepDrawing): CreepGeometry {
  const isNarrow = size.widthPx < 600;
  const frame = {
    left: isNarrow ? 44 : 64,
    right: size.widthPx - 12,
    top: 44,
    bottom: size.heightPx - 44,
  };
  const tested = spanOf(points.map(({ time }) => time));
  const asked = findings.map(({ time }) => time);
  const samples = fit?.samples ?? [];
  const timeSpan = spanOf([
    ...(samples.length > 0 ? samples.map(({ time }) => time) : [tested.from / 2, tested.to * 2]),
    ...asked,
  ]);
  const x = scaleLog().domain([timeSpan.from, timeSpan.to]).range([frame.left, frame.right]);
  const pxPerDecade = (frame.right - frame.left) / Math.log10(timeSpan.to / timeSpan.from);
  const span = complianceSpan({ points, fit, findings }, (frame.bottom - frame.top) / pxPerDecade);
  const y = scaleLog().domain([span.from, span.to]).range([frame.bottom, frame.top]);
  const clampedY = (value: number) => Math.min(frame.bottom, Math.max(frame.top, y(value)));
  const furthest = furthestAsked(findings, tested);
  return {
    frame,
    x: (time) => x(time),
    y: (compliance) => y(compliance),
    times: decadeTicks(timeSpan, (time) => x(time), [1]),
    compliances: decadeTicks(span, (value) => y(value), span.to / span.from > 300 ? [1] : [1, 2, 5]),
    tested: { from: x(tested.from), to: x(tested.to) },
    beyond:
      furthest === null
        ? null
        : { from: x(tested.to), to: x(furthest), decades: Math.log10(furthest / tested.to) },
    curve:
      samples.length < 2
        ? null
        : curvePaths(samples, tested, {
            x: (t) => x(t),
            y: clampedY,
            inFrame: (v) => v >= span.from && v <= span.to,
          }),
    asymptotes: asymptotesOf(fit).flatMap((each) =>
      each.value >= span.from && each.value <= span.to ? [{ ...each, y: y(each.value) }] : [],
    ),
    flags: findings.map((view) => flagOf(view, { frame, x: x(view.time), y: clampedY, isNarrow })),
  };
}

interface Span {
  from: number;
  to: number;
}

function spanOf(values: readonly number[]): Span {
  if (values.length === 0) return { from: 1, to: 10 };
  return { from: Math.min(...values), to: Math.max(...values) };
}

/** Room for the points, the limits and what was judged; and as many decades as the times' axis has in that room. */
function complianceSpan({ points, fit, findings }: Omit<CreepDrawing, 'size'>, roomDecades: number): Span {
  const values = [
    ...points.map(({ value }) => value),
    ...findings.flatMap(({ min, max, estimate, band }) =>
      [min, max, estimate, band?.lower ?? null, band?.upper ?? null].filter((each) => each !== null),
    ),
  ].filter((value) => value > 0);
  const own = spanOf(values);
  const limit = spanOf(points.map(({ value }) => value));
  // A band that has come open would squeeze everything else: a decade and a half either way is enough of it.
  const from = Math.max(own.from, limit.from / 30);
  const to = Math.min(own.to, limit.to * 30);
  const near = asymptotesOf(fit).filter(({ value }) => value >= from / 3 && value <= to * 10);
  const wide = spanOf([from, to, ...near.map(({ value }) => value)]);
  const decades = Math.log10(wide.to / wide.from) + 0.35;
  const half = Math.max(decades, Math.min(roomDecades, decades + 1)) / 2;
  const middle = Math.sqrt(wide.from * wide.to);
  return { from: middle * 10 ** -half, to: middle * 10 ** half };
}

function asymptotesOf(fit: CreepDrawing['fit']) {
  if (fit === null || fit.model !== 'sigmoid') return [];
  return fit.parameters
    .filter(({ symbol }) => symbol === 'D0' || symbol === 'D∞')
    .map(({ symbol, value, low, high, held }) => ({ symbol, value, low, high, held }));
}

function furthestAsked(findings: readonly CreepFindingView[], tested: Span): number | null {
  const latest = Math.max(...findings.map(({ time }) => time), 0);
  return latest > tested.to * 1.01 ? latest : null;
}

interface Scales {
  x(time: number): number;
  y(value: number): number;
  inFrame(value: number): boolean;
}

/** Solid within the tested times, dashed beyond; the band as one closed path. */
function curvePaths(
  samples: readonly CreepSampleView[],
  tested: Span,
  scales: Scales,
): CreepGeometry['curve'] {
  const isInside = ({ time }: CreepSampleView) => time >= tested.from * 0.999 && time <= tested.to * 1.001;
  const inside = pathOf(samples.filter(isInside), scales);
  const before = samples.filter(({ time }) => time <= tested.from * 1.001);
  const after = samples.filter(({ time }) => time >= tested.to * 0.999);
  const outside = [joined(before, samples, 'after'), joined(after, samples, 'before')].map((part) =>
    pathOf(part, scales),
  );
  const upper = samples.map(({ time, upper: end, estimate }) => point(time, end ?? estimate * 1e6, scales));
  const lower = samples
    .toReversed()
    .map(({ time, lower: end, estimate }) => point(time, end ?? estimate * 1e-6, scales));
  return {
    inside: inside,
    outside: outside.filter(Boolean).join(''),
    band: `M${[...upper, ...lower].join('L')}Z`,
  };
}

/** One sample more, so that the dashed part begins where the solid one ends. */
function joined(
  part: readonly CreepSampleView[],
  all: readonly CreepSampleView[],
  side: 'before' | 'after',
): CreepSampleView[] {
  const edge = side === 'before' ? part[0] : part.at(-1);
  if (edge === undefined) return [];
  const neighbour = all[all.indexOf(edge) + (side === 'before' ? -1 : 1)];
  if (neighbour === undefined) return [...part];
  return side === 'before' ? [neighbour, ...part] : [...part, neighbour];
}

function pathOf(samples: readonly CreepSampleView[], scales: Scales): string {
  const shown = samples.filter(({ estimate }) => scales.inFrame(estimate));
  return shown.length < 2
    ? ''
    : `M${shown.map(({ time, estimate }) => point(time, estimate, scales)).join('L')}`;
}

function point(time: number, value: number, { x, y }: Scales): string {
  return `${round(x(time))} ${round(y(value))}`;
}

function decadeTicks(span: Span, at: (value: number) => number, labelled: readonly number[]): Tick[] {
  const ticks: Tick[] = [];
  for (
    let exponent = Math.floor(Math.log10(span.from));
    exponent <= Math.ceil(Math.log10(span.to));
    exponent += 1
  ) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const value = Number(`${digit}e${exponent}`);
      if (value < span.from || value > span.to) continue;
      ticks.push({
        at: at(value),
        label: labelled.includes(digit) ? groupThousands(formatPlain(value)) : null,
      });
    }
  }
  return ticks;
}

function flagOf(
  view: CreepFindingView,
  {
    frame,
    x,
    y,
    isNarrow,
  }: { frame: CreepGeometry['frame']; x: number; y: (value: number) => number; isNarrow: boolean },
): Flag {
  const { finding, min, max, estimate, band } = view;
  const anchor = x > frame.right - (isNarrow ? 130 : 190) ? ('end' as const) : ('start' as const);
  const labelX = anchor === 'end' ? x - 20 : x + 20;
  const decimals = finding.limit?.decimals ?? 0;
  const limits = [
    min === null
      ? null
      : { y: y(min), towards: 'up' as const, label: `at least ${limitText(min, decimals, finding)}` },
    max === null
      ? null
      : { y: y(max), towards: 'down' as const, label: `at most ${limitText(max, decimals, finding)}` },
  ];
  return {
    key: `${finding.rule}~${finding.subject}`,
    x,
    limits: limits.flatMap((limit) =>
      limit === null ? [] : [{ ...limit, label: isNarrow ? '' : limit.label, labelX, anchor }],
    ),
    value:
      estimate === null
        ? null
        : {
            y: y(estimate),
            low: band?.lower == null ? null : y(band.lower),
            high: band?.upper == null ? null : y(band.upper),
          },
    view,
  };
}

/** In the rule's own decimals where its limit is in 1/GPa. */
function limitText(value: number, decimals: number, { limit }: CreepFindingView['finding']): string {
  return limit?.unit === '1/GPa' ? value.toFixed(decimals) : formatPlain(Number(value.toPrecision(3)));
}

function round(px: number): number {
  return Math.round(px * 10) / 10;
}
