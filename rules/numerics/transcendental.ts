import libraryExp from '@stdlib/math-base-special-exp';
import libraryExpm1 from '@stdlib/math-base-special-expm1';
import libraryLn from '@stdlib/math-base-special-ln';
import libraryPower from '@stdlib/math-base-special-pow';

/*
 * The language leaves the last bit of its own exponential, logarithm and power to each engine, and a fit that iterates
 * carries that bit into digits that are judged and sealed. These are additions, multiplications and divisions alone,
 * which IEEE 754 rounds in one way: every engine comes to the same bits. Square roots are rounded so by the standard
 * as well, and stay with the language.
 */

/** e to the power x. */
export function exp(x: number): number {
  return libraryExp(x);
}

/** e to the power x, less one, without cancellation near zero. */
export function expm1(x: number): number {
  return libraryExpm1(x);
}

/** Natural logarithm. */
export function ln(x: number): number {
  return libraryLn(x);
}

/** Logarithm to the base ten; whole for a power of ten, where the quotient may miss it by its last bit. */
export function log10(x: number): number {
  const quotient = libraryLn(x) / Math.LN10;
  const whole = Math.round(quotient);
  return tenTo(whole) === x ? whole : quotient;
}

/** A base to any power. */
export function power(base: number, exponent: number): number {
  return libraryPower(base, exponent);
}

export function squared(x: number): number {
  return x * x;
}

/** Ten to a whole power, as the number nearest to it: an engine's own `10 ** -3` need not be 0.001. */
export function tenTo(exponent: number): number {
  return Number(`1e${exponent}`);
}
