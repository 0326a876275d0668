import Decimal from 'decimal.js';
import type { RoomStretch } from './room';
import { lastAlike, type Side } from './side-of-limit';

export interface StretchInput {
  /** Tested binder contents between which the value is known, %. */
  from: number;
  to: number;
  /** Contents between which the value only rises or only falls. */
  turns: readonly number[];
  sideAt(binderContent: number): Side;
}

/**
 * The ranges of binder content in which a rule holds, to 0.01 % from the inside: an end holds and 0.01 % beyond it
 * the rule does not, or the trials end there. Between two turns the value goes one way, so that the place where the
 * rule begins or ceases to hold is found by halving, and every answer is one that the rule itself gave.
 */
export function stretchesOf(input: StretchInput): RoomStretch[] {
  const places = placesOf(input);
  const sides = new Map<number, Side>();
  const sideOf = (index: number): Side => {
    const known = sides.get(index) ?? input.sideAt(places[index]!.content);
    sides.set(index, known);
    return known;
  };
  const last = places.length - 1;
  const turns = places.flatMap(({ isTurn }, index) => (isTurn ? [index] : []));
  const corners = [0, ...turns, last];
  const inside: [number, number][] = [];
  for (let piece = 0; piece + 1 < corners.length; piece += 1) {
    for (const run of runsInside(corners[piece]!, corners[piece + 1]!, sideOf)) {
      const before = inside.at(-1);
      if (before && run[0] <= before[1] + 1) before[1] = Math.max(before[1], run[1]);
      else inside.push(run);
    }
  }
  return inside.flatMap(([first, end]) => stretchOf(places, first, end));
}

/** Ranges common to two rules. */
export function common(left: readonly RoomStretch[], right: readonly RoomStretch[]): RoomStretch[] {
  return left.flatMap((one) =>
    right.flatMap((other): RoomStretch[] => {
      const from = Math.max(one.from, other.from);
      const to = Math.min(one.to, other.to);
      if (from > to) return [];
      const opens = [one, other].filter((each) => each.from === from);
      const closes = [one, other].filter((each) => each.to === to);
      return [
        {
          from,
          to,
          below: opens.some(({ below }) => below === 'limit') ? 'limit' : 'trials',
          above: closes.some(({ above }) => above === 'limit') ? 'limit' : 'trials',
        },
      ];
    }),
  );
}

interface Place {
  content: number;
  isTurn: boolean;
  /** True where a range may end: a multiple of 0.01, or the end of the trials. */
  mayEnd: boolean;
}

/** Every 0.01 % between the trials' ends, the ends themselves and the turns, in rising order. */
function placesOf({ from, to, turns }: StretchInput): Place[] {
  const first = new Decimal(from).times(100).ceil().toNumber();
  const last = new Decimal(to).times(100).floor().toNumber();
  const places: Place[] = [];
  for (let hundredths = first; hundredths <= last; hundredths += 1) {
    places.push({ content: hundredths / 100, isTurn: false, mayEnd: true });
  }
  const others = [...turns.map((content) => ({ content, isTurn: true })), ...[from, to].map(asEnd)];
  for (const { content, isTurn } of others) {
    const known = places.find((place) => place.content === content);
    if (known) known.isTurn ||= isTurn;
    else places.push({ content, isTurn, mayEnd: !isTurn });
  }
  return places.sort((a, b) => a.content - b.content);
}

function asEnd(content: number): { content: number; isTurn: boolean } {
  return { content, isTurn: false };
}

/** Runs of places that are inside, from one corner to the next. */
function runsInside(first: number, last: number, sideOf: (index: number) => Side): [number, number][] {
  const runs: [number, number][] = [];
  let start = first;
  while (start <= last) {
    const side = sideOf(start);
    const end = lastAlike(start, last, (index) => sideOf(index) === side);
    if (side === 'inside') runs.push([start, end]);
    start = end + 1;
  }
  return runs;
}

/** A turn between two hundredths is no end: the range then ends at the hundredth inside. */
function stretchOf(places: readonly Place[], first: number, end: number): RoomStretch[] {
  let start = first;
  let stop = end;
  while (start <= stop && !places[start]!.mayEnd) start += 1;
  while (stop >= start && !places[stop]!.mayEnd) stop -= 1;
  if (start > stop) return [];
  return [
    {
      from: places[start]!.content,
      to: places[stop]!.content,
      below: start === 0 ? 'trials' : 'limit',
      above: stop === places.length - 1 ? 'trials' : 'limit',
    },
  ];
}
