import { type Exact, minus, over, plus, times, total } from './exact';

interface Place {
  x: Exact;
  y: Exact;
}

/**
 * The parabola of least squares at a place, from orthogonal polynomials: 1, x − m and the square with what those two
 * hold of it taken off.
 */
export function parabolaAt(places: Place[], at: Exact): Exact {
  const count = { top: BigInt(places.length), bottom: 1n };
  const middle = over(total(places.map(({ x }) => x)), count);
  const straight = (x: Exact) => minus(x, middle);
  const squares = total(places.map(({ x }) => times(straight(x), straight(x))));
  const cubes = total(places.map(({ x }) => times(straight(x), times(straight(x), straight(x)))));
  const curved = (x: Exact) => {
    const own = times(straight(x), straight(x));
    const held = plus(over(squares, count), times(over(cubes, squares), straight(x)));
    return minus(own, held);
  };
  const one = () => ({ top: 1n, bottom: 1n });
  const parts = [one, straight, curved].map((part) => {
    const along = total(places.map(({ x, y }) => times(part(x), y)));
    const length = total(places.map(({ x }) => times(part(x), part(x))));
    return times(over(along, length), part(at));
  });
  return total(parts);
}
