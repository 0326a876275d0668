import type { Conditions } from '../record';
import { viewOf } from '../rule-sets/edition-view';
import { readFormula } from '../rule-sets/formula';
import { comparisonsOf } from '../rule-sets/when';
import type { ReadingEdition } from './edition-contents';

export interface MeasuredQuantity {
  quantity: string;
  at: Conditions;
  /** What is measured on the same specimens, where a rule asks it to tell which of them count. */
  besides?: string;
}

/** Every quantity that an edition's rules look at, with the conditions that they name, each once. */
export function measuredQuantities(edition: ReadingEdition): MeasuredQuantity[] {
  const found: MeasuredQuantity[] = [];
  for (const { measure, limit, when } of edition.rules) {
    const besides = 'quantity' in measure ? { besides: measure.quantity } : {};
    for (const { quantity, at } of measure.where ?? []) found.push({ quantity, at, ...besides });
    for (const bound of [limit.min, limit.max, limit.target]) {
      if (typeof bound === 'object' && 'quantity' in bound)
        found.push({ quantity: bound.quantity, at: bound.at });
    }
    for (const { comparison } of when ? comparisonsOf(when) : []) {
      if (comparison.params) found.push(comparison.params);
    }
    switch (measure.kind) {
      case 'reading':
        found.push({ quantity: measure.quantity, at: measure.at });
        break;
      case 'gradation':
        found.push({ quantity: 'percent-passing', at: measure.at });
        break;
      case 'difference':
        found.push({ quantity: measure.quantity, at: {} });
        if (measure.between[0] === 'contractor')
          found.push({ quantity: measure.quantity, at: { laboratory: 'agency' } });
        break;
      case 'creep-compliance':
        found.push({
          quantity: 'creep-compliance',
          at: { temperature: measure.temperature, time: measure.time },
        });
        break;
      case 'formula': {
        const formula = readFormula(measure.expression, viewOf(edition));
        for (const { quantity, sieve } of formula.ok ? formula.formula.symbols : [])
          found.push({ quantity, at: sieve === null ? measure.at : { ...measure.at, sieve } });
        break;
      }
      case 'attribute':
      case 'document':
        break;
    }
  }
  const keyed = new Map(found.map((each) => [JSON.stringify([each.quantity, each.at, each.besides]), each]));
  return [...keyed.values()];
}

/** Openings of the sieves that the edition's tables and rules name, in mm. */
export function namedSieves(edition: ReadingEdition): number[] {
  const openings = edition.tables
    .filter((table) => table.keys.includes('sieve'))
    .flatMap((table) => table.rows.map((row) => row.sieve))
    .filter((opening) => typeof opening === 'number');
  const ofRules = measuredQuantities(edition).flatMap(({ at }) => (at.sieve === undefined ? [] : [at.sieve]));
  return [...new Set([...openings, ...ofRules])].toSorted((a, b) => b - a);
}
