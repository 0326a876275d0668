import Decimal from 'decimal.js';
import { cannot, known, type NumericResult } from '../numerics/numeric-result';
import type { Expression, FormulaFunction, Operator } from '../rule-sets/formula-parser';

/**
 * The value of a formula, in decimal arithmetic, so that 2.651 − 2.648 is 0.003 and not a hair below a limit.
 *
 * It cannot be had where it divides by zero, leaves the domain of a function or grows beyond every number.
 */
export function computeFormula(expression: Expression, values: ReadonlyMap<string, number>): NumericResult {
  try {
    const value = numberOf(expression, values);
    const number = value.toNumber();
    return Number.isFinite(number) ? known(number) : cannot('the formula gives a number without bounds');
  } catch (error) {
    if (error instanceof NoValue) return cannot(error.message);
    throw error;
  }
}

class NoValue extends Error {}

function numberOf(expression: Expression, values: ReadonlyMap<string, number>): Decimal {
  switch (expression.kind) {
    case 'number':
      return new Exact(expression.written);
    case 'name': {
      const value = values.get(expression.name);
      if (value === undefined || !Number.isFinite(value))
        throw new NoValue(`${expression.name} has no value`);
      return new Exact(value);
    }
    case 'operation':
      return operated(
        expression.operator,
        expression.operands.map((each) => numberOf(each, values)),
      );
    case 'call':
      return called(
        expression.name,
        expression.operands.map((each) => numberOf(each, values)),
      );
  }
}

function operated(operator: Operator, [left = zero, right = zero]: Decimal[]): Decimal {
  switch (operator) {
    case 'add':
      return left.plus(right);
    case 'subtract':
      return left.minus(right);
    case 'multiply':
      return left.times(right);
    case 'divide':
      if (right.isZero()) throw new NoValue('the formula divides by zero');
      return left.div(right);
    case 'pow':
      return power(left, right);
    case 'unaryMinus':
      return left.negated();
    case 'unaryPlus':
      return left;
  }
}

function power(base: Decimal, exponent: Decimal): Decimal {
  if (base.isZero() && exponent.isNegative()) throw new NoValue('the formula divides by zero');
  if (base.isZero() && exponent.isZero()) throw new NoValue('zero to the power of zero has no value');
  if (base.isNegative() && !exponent.isInteger()) {
    throw new NoValue('a power of a negative number that is not whole has no value');
  }
  return base.pow(exponent);
}

function called(name: FormulaFunction, operands: Decimal[]): Decimal {
  const [value = zero] = operands;
  switch (name) {
    case 'abs':
      return value.abs();
    case 'min':
      return Exact.min(...operands);
    case 'max':
      return Exact.max(...operands);
    case 'exp':
      return value.exp();
    case 'sqrt':
      if (value.isNegative() && !value.isZero())
        throw new NoValue('the root of a negative number has no value');
      return value.sqrt();
    case 'ln':
    case 'log10':
      if (value.lessThanOrEqualTo(0)) {
        throw new NoValue('the logarithm of a number that is not above zero has no value');
      }
      return name === 'ln' ? value.ln() : value.log(10);
  }
}

const Exact = Decimal.clone({ precision: 40 });
const zero = new Exact(0);
