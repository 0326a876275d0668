import { describe, expect, it } from 'vitest';
import type { GradationPoint } from '#shared/contracts/checks';
import { gradationGeometry } from '../../../../web/features/gradation/lib/gradation-geometry';

const point = (sieve: number, passing: number, more: Partial<GradationPoint> = {}): GradationPoint => ({
  sieve,
  usName: null,
  passing,
  min: null,
  max: null,
  outcome: null,
  sheet: null,
  cell: null,
  ...more,
});
const size = { widthPx: 454, heightPx: 454 };
const points = [point(19, 100), point(4.75, 58), point(0.075, 5.6, { min: 2, max: 10, outcome: 'pass' })];

describe('the gradation chart', () => {
  it('places sieves by their opening to the power 0.45', () => {
    const { points: placed, frame } = gradationGeometry(points, 19, size);
    const share = ((placed[1]?.x ?? 0) - frame.left) / (frame.right - frame.left);
    // (4.75 / 19)^0.45 = 0.25^0.45 = 0.5359 by hand.
    expect(share).toBeCloseTo(0.5359, 4);
  });

  it('runs the line of maximum density from nothing to all at the maximum size', () => {
    const { maximumDensity, frame } = gradationGeometry(points, 19, size);
    expect(maximumDensity).toEqual({ x1: frame.left, y1: frame.bottom, x2: frame.right, y2: frame.top });
  });

  it('draws no such line where the maximum size is not known', () => {
    expect(gradationGeometry(points, null, size).maximumDensity).toBeNull();
  });

  it('lets a one-sided control point run to the frame', () => {
    const { controls, frame } = gradationGeometry([point(9.5, 86, { max: 90 }), point(19, 100)], 19, size);
    expect(controls[0]?.to).toBe(frame.bottom);
    expect(controls[0]?.ticks.map((tick) => tick.label)).toEqual(['90']);
  });

  it('keeps the points in the order of their sieves whatever order they come in', () => {
    const shuffled = [points[2], points[0], points[1]].filter((each) => each !== undefined);
    expect(gradationGeometry(shuffled, 19, size).blend).toBe(gradationGeometry(points, 19, size).blend);
  });

  it('tells a failing sieve from the rest', () => {
    const geometry = gradationGeometry([point(2.36, 62, { max: 58, outcome: 'fail' }), ...points], 19, size);
    expect(geometry.points.filter((each) => each.fails).map((each) => each.point.sieve)).toEqual([2.36]);
  });
});
