import { decimalsOf, roundTo } from '../numerics/round';
import { log10 } from '../numerics/transcendental';
import type { Reading } from '../record';
import { numberWords, unitSuffix } from '../rule-sets/words';
import { displayedUnit } from './analysis-digits';
import type { ToPass } from './explanation';
import { lastAlike, type Side } from './side-of-limit';
import type { World } from './world';

export interface Search {
  present: number;
  step: number;
  /** Where the reading may move to while it is looked for the first value that passes. */
  plausible: { min: number; max: number };
  /** How far it may go on passing, where that is farther. */
  beyond?: { min: number; max: number };
  valueAt(reading: number): number | null;
  sideOf(value: number | null): Side;
}

/** The nearest step at which the rule is met, and how far it stays met; null where it never is or not one way. */
export function search(input: Search): { from: number | null; to: number | null } | null {
  const { present, step, valueAt } = input;
  const start = input.sideOf(valueAt(present));
  const direction = directionOf(input);
  if (start === 'inside' || direction === 0) return null;
  const towards = (start === 'below') === direction > 0 ? 1 : -1;
  const first = (towards > 0 ? Math.floor : Math.ceil)(present / step + towards * 1e-9) + towards;
  const reading = (steps: number) => Number(((first + towards * steps) * step).toPrecision(12));
  const sideAt = (steps: number) => input.sideOf(valueAt(reading(steps)));
  const isKnown = (steps: number) => valueAt(reading(steps)) !== null;
  const within = (range: { min: number; max: number }) => {
    const steps = stepsWithin(range, reading(0), towards, step);
    return steps >= 0 && isKnown(0) ? lastAlike(0, steps, isKnown) : -1;
  };
  const most = within(input.plausible);
  if (most < 0 || sideAt(most) === start) return null;
  const enters = sideAt(0) === start ? lastAlike(0, most, (steps) => sideAt(steps) === start) + 1 : 0;
  if (sideAt(enters) !== 'inside') return null;
  const farthest = within(input.beyond ?? input.plausible);
  const leaves = lastAlike(enters, farthest, (steps) => sideAt(steps) === 'inside');
  const near = reading(enters);
  const far = leaves === farthest ? null : reading(leaves);
  return towards > 0 ? { from: near, to: far } : { from: far, to: near };
}

/** 1 where the value rises with the reading over all that is plausible, −1 where it falls, 0 where it does neither. */
function directionOf({ present, plausible, valueAt }: Search): 1 | -1 | 0 {
  const low = Math.min(plausible.min, present);
  const high = Math.max(plausible.max, present);
  const values = Array.from({ length: SAMPLES + 1 }, (_, place) =>
    valueAt(low + ((high - low) * place) / SAMPLES),
  );
  let direction: 1 | -1 | 0 = 0;
  for (let place = 1; place <= SAMPLES; place += 1) {
    const before = values[place - 1];
    const after = values[place];
    // What cannot be computed far from the present reading says nothing about how it goes near it.
    if (before === null || after === null || before === undefined || after === undefined || after === before)
      continue;
    const sign = after > before ? 1 : -1;
    if (direction !== 0 && sign !== direction) return 0;
    direction = sign;
  }
  return direction;
}

const SAMPLES = 16;

function stepsWithin(
  { min, max }: { min: number; max: number },
  from: number,
  towards: number,
  step: number,
): number {
  const room = towards > 0 ? max - from : from - min;
  return Math.floor(room / step + 1e-9);
}

export function plausibleOf(world: World, quantity: string): { min: number; max: number } {
  const { min = 0, max = Number.MAX_SAFE_INTEGER } = world.view.quantity(quantity)?.plausible ?? {};
  return { min, max };
}

/** The digit that the laboratory writes, but no finer than is usual; of converted values the usual one. */
export function stepOf(world: World, quantity: string, readings: readonly Reading[]): number {
  const usual = Number(`1e-${world.view.quantity(quantity)?.decimals ?? 2}`);
  const own = readings.filter((reading) => reading.quantity === quantity).map(displayedUnit);
  const written = own.length === 0 ? usual : Number(Math.min(...own).toPrecision(6));
  const isDigit = Math.abs(log10(written) - Math.round(log10(written))) < 1e-9;
  return isDigit ? Math.max(usual, written) : usual;
}

/** What is moved, with the digits that it is written in. */
export interface Moved extends Omit<ToPass, 'words'> {
  present: number;
  step: number;
  /** Results behind it: a mean where there are several. */
  count: number;
}

/** The way in words. */
export function said(way: Moved): ToPass {
  const { step, count, ...rest } = way;
  const decimals = decimalsOf(step);
  const { name, unit, present, from, to } = rest;
  const number = (value: number) => numberWords(value, decimals);
  const range =
    from === null
      ? `${number(to ?? present)}${unitSuffix(unit)} or less`
      : to === null
        ? `${number(from)}${unitSuffix(unit)} or more`
        : from === to
          ? `${number(from)}${unitSuffix(unit)}`
          : `${number(from)} to ${number(to)}${unitSuffix(unit)}`;
  const of = count > 1 ? ` (mean of ${count})` : '';
  return { ...rest, words: `${name} of ${range} instead of ${presentWords(present, step)}${of}` };
}

/** One digit more than the laboratory writes where the present value is a mean between two of its steps. */
function presentWords(present: number, step: number): string {
  const decimals = decimalsOf(step);
  const rounded = roundTo({ value: present, to: step, method: 'rounding' });
  return numberWords(present, Math.abs(rounded - present) < step * 1e-6 ? decimals : decimals + 1);
}
