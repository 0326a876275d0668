import { decimalsOf, formatDecimals } from '../numerics/round';
import { tenTo } from '../numerics/transcendental';
import type { Reading } from '../record';
import type { NamedCause } from './analysis';
import { type Cause, type CauseInputs, causes } from './analysis-cause-table';
import { displayedUnit, showsAs } from './analysis-digits';

/** The one named mistake that shows the reported digits, or null where none does or more than one. */
export function causeOf(quantity: string, reported: Reading, inputs: CauseInputs): NamedCause | null {
  const matching = [...(causes[quantity] ?? []), ...slips(reported)].flatMap(({ id, text, compute }) => {
    const value = compute(inputs);
    return Number.isFinite(value) && showsAs(value, reported) ? [{ id, text, value }] : [];
  });
  return matching.length === 1 ? matching[0]! : null;
}

/** Slips of the hand, whatever is calculated: only the right value with its digits out of place. */
function slips(reported: Reading): Cause[] {
  return [
    {
      id: 'decimal-point-moved',
      text: 'has the decimal point out of place',
      compute: ({ own }) =>
        misplacements
          .map((places) => own * tenTo(places))
          .find((value) => value !== 0 && showsAs(value, reported)) ?? Number.NaN,
    },
    {
      id: 'digits-swapped',
      text: 'has two neighbouring digits swapped',
      compute: ({ own }) =>
        withSwappedDigits(own, displayedUnit(reported)).find((value) => showsAs(value, reported)) ??
        Number.NaN,
    },
  ];
}

/** By two places it is a percentage written as a fraction: the reader asks about that, and the answer decides. */
const misplacements = [-3, -1, 1, 3];

/** A value with every two neighbouring digits of its printed form in the other order. */
function withSwappedDigits(value: number, unit: number): number[] {
  const decimals = decimalsOf(unit);
  if (!Number.isFinite(value) || decimals > 6 || unit > 1) return [];
  const text = formatDecimals(value, decimals);
  const digits = [...text].flatMap((character, place) => (/\d/.test(character) ? [place] : []));
  return digits.slice(1).flatMap((place, before) => {
    const other = digits[before]!;
    if (text[place] === text[other]) return [];
    const swapped = [...text];
    [swapped[place], swapped[other]] = [text[other]!, text[place]!];
    return [Number(swapped.join(''))];
  });
}
