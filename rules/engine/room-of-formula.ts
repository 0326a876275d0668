import Decimal from 'decimal.js';
import type { PropertyCurve } from '../calculations/design-point';
import { cannot } from '../numerics/numeric-result';
import type { Conditions } from '../record';
import { type FormulaSymbol, readFormula } from '../rule-sets/formula';
import type { FormulaMeasure } from '../rule-sets/measure';
import { computeFormula } from './compute-formula';
import { conditionsOfSymbol } from './formula-inputs';
import { quantityValue } from './quantity-value';
import { curveOf, leftOut, notComputed, type Refusal } from './room-curves';
import { isPerTrial } from './scope';
import type { World } from './world';

/**
 * The curve of a formula over the binder content: each symbol on its own curve between the trials, as the rule itself
 * reads the design, or the same at every content where it belongs to aggregate or binder. A formula of curves may turn
 * anywhere, so that every 0.01 % counts as a turn.
 */
export function formulaCurve(
  world: World,
  measure: FormulaMeasure,
): { ok: true; curve: PropertyCurve } | Refusal {
  const read = readFormula(measure.expression, world.view);
  if (!read.ok) return notComputed(read.detail);
  if (measure.where !== undefined)
    return leftOut('Between trials only the mean is known, not the values of single specimens.');
  const { expression, symbols } = read.formula;
  const curves = new Map<string, PropertyCurve>();
  const constants = new Map<string, number>();
  for (const symbol of symbols) {
    const at = conditionsOfSymbol(symbol, measure.at);
    if (isConstant(world, symbol, at)) {
      const value = quantityValue(world, symbol.quantity, at);
      if (!value.ok) return notComputed(value.reason);
      constants.set(symbol.symbol, value.value);
      continue;
    }
    const curve = curveOf(world, { quantity: symbol.quantity, at });
    if (!curve.ok) return curve;
    curves.set(symbol.symbol, curve.curve);
  }
  const moving = [...curves.values()];
  if (moving.length === 0) return leftOut('Nothing in its formula changes with the binder content.');
  const from = Math.max(...moving.map((curve) => curve.from));
  const to = Math.min(...moving.map((curve) => curve.to));
  if (from >= to) return notComputed('The trials of its symbols have no binder contents in common.');
  return {
    ok: true,
    curve: {
      ok: true,
      method: moving.some(({ method }) => method === 'quadratic') ? 'quadratic' : 'linear',
      from,
      to,
      turns: hundredthsWithin(from, to),
      at: (content) => {
        const values = new Map(constants);
        for (const [symbol, curve] of curves) {
          const value = curve.at(content);
          if (!value.ok) return cannot(value.reason);
          values.set(symbol, value.value);
        }
        return computeFormula(expression, values);
      },
    },
  };
}

/** Aggregate and binder are the same in every trial, and so is the job-mix gradation. */
function isConstant(world: World, { quantity }: FormulaSymbol, at: Conditions): boolean {
  if (at.trial !== undefined && at.trial !== 'design') return false;
  return quantity === 'percent-passing' || !isPerTrial(world, quantity);
}

function hundredthsWithin(from: number, to: number): number[] {
  const first = new Decimal(from).times(100).floor().plus(1).toNumber();
  const last = new Decimal(to).times(100).ceil().minus(1).toNumber();
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, place) => (first + place) / 100);
}
