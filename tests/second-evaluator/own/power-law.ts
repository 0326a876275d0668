/**
 * D = D0 + D1·t^m through three points whose times stand in one ratio: the differences of D are in the ratio r^m.
 * Exact where the points lie on such a curve.
 */
export function throughThreePoints(points: { time: number; value: number }[], time: number): number {
  const [one, two, three] = points as [Point, Point, Point];
  const ratio = two.time / one.time;
  const exponent = Math.log((three.value - two.value) / (two.value - one.value)) / Math.log(ratio);
  const slope = (two.value - one.value) / (two.time ** exponent - one.time ** exponent);
  return one.value + slope * (time ** exponent - one.time ** exponent);
}

interface Point {
  time: number;
  value: number;
}
