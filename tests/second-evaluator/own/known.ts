/** What the trade says of the quantities that are drawn; the engine's registry is not asked. */
export interface Known {
  unit: string;
  /** Whose property it is: of a mix's trial, or of the aggregate or binder in all trials. */
  of: 'mix' | 'aggregate' | 'binder';
  /** Single-operator standard deviation that the method publishes; from memory, verify. */
  deviation?: number;
  bySieve?: true;
}

export const KNOWN: Record<string, Known> = {
  'marshall-stability': { unit: 'kN', of: 'mix' },
  'marshall-flow': { unit: 'mm', of: 'mix' },
  draindown: { unit: '%', of: 'mix' },
  coating: { unit: '%', of: 'mix' },
  'mix-moisture': { unit: '%', of: 'mix' },
  'fibre-content': { unit: '%', of: 'mix' },
  'lime-content': { unit: '%', of: 'mix' },
  'lift-thickness': { unit: 'mm', of: 'mix' },
  'retained-stability': { unit: '%', of: 'mix' },
  'overlay-cycles': { unit: 'cycles', of: 'mix' },
  'bulk-specific-gravity-mix': { unit: '1', of: 'mix', deviation: 0.0124 },
  'maximum-specific-gravity': { unit: '1', of: 'mix', deviation: 0.0051 },
  'wheel-track-rut-depth': { unit: 'mm', of: 'mix' },
  'loaded-wheel-rut-depth': { unit: 'mm', of: 'mix' },
  'high-temperature-tensile-strength': { unit: 'kPa', of: 'mix' },
  'dynamic-modulus': { unit: 'MPa', of: 'mix' },
  'proportional-rut-depth': { unit: '%', of: 'mix' },
  permeability: { unit: '10⁻⁵ cm/s', of: 'mix' },
  'gyrations-initial': { unit: 'gyrations', of: 'mix' },
  'gyrations-design': { unit: 'gyrations', of: 'mix' },
  'gyrations-maximum': { unit: 'gyrations', of: 'mix' },
  'relative-density': { unit: '%', of: 'mix', deviation: 0.3 },
  'water-absorption': { unit: '%', of: 'aggregate', deviation: 0.088 },
  'sand-equivalent': { unit: '%', of: 'aggregate' },
  'abrasion-loss': { unit: '%', of: 'aggregate' },
  'micro-deval-loss': { unit: '%', of: 'aggregate' },
  'flat-and-elongated': { unit: '%', of: 'aggregate' },
  'soundness-loss': { unit: '%', of: 'aggregate' },
  'plasticity-index': { unit: '1', of: 'aggregate' },
  'percent-passing': { unit: '%', of: 'aggregate', bySieve: true },
  'percent-retained': { unit: '%', of: 'aggregate', bySieve: true },
  'cumulative-percent-retained': { unit: '%', of: 'aggregate', bySieve: true },
  'stockpile-share': { unit: '%', of: 'aggregate' },
  'bulk-specific-gravity-aggregate': { unit: '1', of: 'aggregate', deviation: 0.009 },
  'binder-content': { unit: '%', of: 'mix' },
  'softening-point': { unit: '°C', of: 'binder' },
  penetration: { unit: 'dmm', of: 'binder' },
  'elastic-recovery': { unit: '%', of: 'binder' },
  'air-voids': { unit: '%', of: 'mix', deviation: 0.21 },
  'creep-strain': { unit: 'µε', of: 'mix' },
  'creep-compliance': { unit: '1/GPa', of: 'mix' },
};

export function knownOf(quantity: string): Known {
  const known = KNOWN[quantity];
  if (known === undefined) throw new Error(`Nothing is known here of ${quantity}.`);
  return known;
}
