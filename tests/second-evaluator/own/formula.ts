import {
  asNumber,
  compare,
  type Exact,
  exact,
  greatest,
  least,
  magnitude,
  minus,
  over,
  plus,
  times,
} from './exact';
import { toTwelveDigits } from './rounding';

/** Value of a name in a formula. */
export type ValueBy = (name: string) => Exact;

/** A formula without a value: a division by zero, a root of a negative number. */
export class NoValue extends Error {}

/** Names of quantities in a formula, each once. */
export function namesIn(expression: string): string[] {
  const names = tokens(expression).filter((token) => /^\p{L}/u.test(token) && !FUNCTIONS.has(token));
  return [...new Set(names)];
}

/** Computed exactly by descent: sums of products of powers, with brackets, signs and a few functions. */
export function computed(expression: string, valueBy: ValueBy): Exact {
  const rest = tokens(expression);
  const value = sum(rest, valueBy);
  if (rest.length > 0) throw new Error(`The formula goes on after its end: ${rest.join(' ')}.`);
  return value;
}

const FUNCTIONS = new Set(['abs', 'min', 'max', 'sqrt', 'ln', 'log10', 'exp']);

function tokens(expression: string): string[] {
  return expression.match(/\d+(\.\d+)?|\p{L}+[\p{L}\d.]*|[-+*/^(),]/gu) ?? [];
}

function sum(rest: string[], valueBy: ValueBy): Exact {
  let value = product(rest, valueBy);
  while (rest[0] === '+' || rest[0] === '-') {
    const sign = rest.shift();
    const next = product(rest, valueBy);
    value = sign === '+' ? plus(value, next) : minus(value, next);
  }
  return value;
}

function product(rest: string[], valueBy: ValueBy): Exact {
  let value = signed(rest, valueBy);
  while (rest[0] === '*' || rest[0] === '/') {
    const sign = rest.shift();
    const next = signed(rest, valueBy);
    if (sign === '/' && next.top === 0n) throw new NoValue();
    value = sign === '*' ? times(value, next) : over(value, next);
  }
  return value;
}

/** A sign holds less tightly than a power: -2^2 is -4. */
function signed(rest: string[], valueBy: ValueBy): Exact {
  if (rest[0] === '-') {
    rest.shift();
    return minus(exact(0), signed(rest, valueBy));
  }
  return power(rest, valueBy);
}

function power(rest: string[], valueBy: ValueBy): Exact {
  const base = atom(rest, valueBy);
  if (rest[0] !== '^') return base;
  rest.shift();
  const exponent = asNumber(signed(rest, valueBy));
  let value = exact(1);
  for (let i = 0; i < exponent; i += 1) value = times(value, base);
  return value;
}

function atom(rest: string[], valueBy: ValueBy): Exact {
  const token = rest.shift();
  if (token === undefined) throw new Error('The formula ends too early.');
  if (token === '(') return closed(rest, [sum(rest, valueBy)])[0]!;
  if (/^\d/.test(token)) return exact(token);
  if (!FUNCTIONS.has(token)) return valueBy(token);
  rest.shift();
  const given = [sum(rest, valueBy)];
  while (rest[0] === ',') {
    rest.shift();
    given.push(sum(rest, valueBy));
  }
  return applied(token, closed(rest, given));
}

function closed(rest: string[], values: Exact[]): Exact[] {
  if (rest.shift() !== ')') throw new Error('The formula does not close a bracket.');
  return values;
}

function applied(name: string, values: Exact[]): Exact {
  const [first] = values as [Exact];
  if (name === 'abs') return magnitude(first);
  if (name === 'min') return least(values);
  if (name === 'max') return greatest(values);
  if (name === 'exp') return toTwelveDigits(Math.exp(asNumber(first)));
  const isOutside = name === 'sqrt' ? compare(first, exact(0)) < 0 : compare(first, exact(0)) <= 0;
  if (isOutside) throw new NoValue();
  if (name === 'sqrt') return toTwelveDigits(Math.sqrt(asNumber(first)));
  return toTwelveDigits(name === 'ln' ? Math.log(asNumber(first)) : Math.log10(asNumber(first)));
}
