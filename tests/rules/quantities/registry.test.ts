import { describe, expect, it } from 'vitest';
import { quantitySchema } from '#rules/quantities/quantity';
import { allQuantities, quantityById } from '#rules/quantities/registry';
import { convert, normaliseUnit } from '#rules/quantities/units';

/** The ids that rule sets, mappings and records rely on. */
const fixedIds = [
  'binder-content',
  'design-binder-content',
  'binder-specific-gravity',
  'maximum-specific-gravity',
  'bulk-specific-gravity-mix',
  'bulk-specific-gravity-aggregate',
  'apparent-specific-gravity-aggregate',
  'effective-specific-gravity-aggregate',
  'water-absorption',
  'stockpile-share',
  'percent-passing',
  'percent-retained',
  'cumulative-percent-retained',
  'air-voids',
  'voids-in-mineral-aggregate',
  'voids-filled-with-asphalt',
  'absorbed-binder',
  'effective-binder-content',
  'effective-binder-volume',
  'dust-proportion',
  'film-thickness',
  'relative-density',
  'field-density',
  'gyrations-initial',
  'gyrations-design',
  'gyrations-maximum',
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-density-mix',
  'maximum-density-mix',
  'specimen-height',
  'specimen-diameter',
  'specimen-thickness',
  'failure-load',
  'degree-of-saturation',
  'horizontal-deformation',
  'vertical-deformation',
  'fracture-energy',
  'coarse-aggregate-angularity-one-face',
  'coarse-aggregate-angularity-two-faces',
  'fine-aggregate-angularity',
  'flat-and-elongated',
  'sand-equivalent',
  'abrasion-loss',
  'soundness-loss',
  'deleterious-materials',
  'rap-content',
  'rap-binder-content',
  'ras-content',
  'recycled-binder-ratio',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
  'tensile-strength-ratio',
  'wheel-track-rut-depth',
  'stripping-inflection-point',
  'cracking-tolerance-index',
  'flexibility-index',
  'dynamic-modulus',
  'flow-number',
  'marshall-stability',
  'marshall-flow',
  'draindown',
  'mixing-temperature',
  'compaction-temperature',
  'creep-strain',
  'creep-compliance',
];

it.each(fixedIds)('knows %s', (id) => {
  expect(quantityById(id)?.id).toBe(id);
});

it('knows no id that it does not have', () => {
  expect(quantityById('no-such-quantity')).toBeUndefined();
  expect(quantityById('constructor')).toBeUndefined();
});

it('holds at least 140 quantities', () => {
  expect(allQuantities().length).toBeGreaterThanOrEqual(140);
});

it('has each id and each symbol once', () => {
  const ids = allQuantities().map(({ id }) => id);
  const symbols = allQuantities().map(({ symbol }) => symbol);
  expect(new Set(ids).size).toBe(ids.length);
  expect(new Set(symbols).size).toBe(symbols.length);
});

it('gives no name to two quantities, whatever its case and punctuation', () => {
  const owners = new Map<string, Set<string>>();
  for (const { id, label, symbol, aliases } of allQuantities()) {
    for (const name of [label, symbol, ...aliases]) {
      const key = name.toLowerCase().replace(/[\s\-–_.,()]/g, '');
      owners.set(key, (owners.get(key) ?? new Set()).add(id));
    }
  }
  expect([...owners].filter(([, ids]) => ids.size > 1).map(([name]) => name)).toEqual([]);
});

describe.each(allQuantities())('$id', (quantity) => {
  it('has units that are known and convert to its own', () => {
    for (const unit of quantity.acceptedUnits) {
      expect(normaliseUnit(unit)).toBe(unit);
      expect(convert(1, unit, quantity.unit)).toMatchObject({ ok: true });
    }
    expect(quantity.acceptedUnits).toContain(quantity.unit);
  });

  it('can say how it is derived if it is, and has a label that can open a sentence', () => {
    expect(quantity.kind === 'derived').toBe(quantity.derivation !== null);
    expect(quantity.label).toBe(quantity.label.trim());
    expect(quantity.label.endsWith('.')).toBe(false);
  });

  it('has a plausible range of its own, and names a source where it is derived', () => {
    expect(quantity.plausible.max - quantity.plausible.min).toBeLessThan(1e11);
    if (quantity.kind === 'derived') expect(quantity.source).not.toContain('no source');
  });

  it('names test methods by their standard, each once', () => {
    expect(new Set(quantity.methods).size).toBe(quantity.methods.length);
    for (const method of quantity.methods)
      expect(method).toMatch(/^(AASHTO (T|R|M|TP)|ASTM [CD]|EN|ISO) ?\d/);
  });

  it('says that a precision recalled from memory is', () => {
    expect(['read', 'derived', 'memory', 'agency', undefined]).toContain(quantity.methodPrecision?.origin);
    if (quantity.methodPrecision) expect(quantity.methodPrecision.source.length).toBeGreaterThan(0);
  });
});

it('fills in what a declared quantity leaves out', () => {
  const declared = quantitySchema.parse({
    id: 'texture-depth',
    symbol: 'MTD',
    label: 'mean texture depth',
    unit: 'mm',
  });
  expect(declared).toMatchObject({
    kind: 'measured',
    subject: 'mix',
    gaugeScale: 'linear',
    conditions: [],
    plural: false,
  });
});

it('refuses a plausible range that is turned round', () => {
  const entry = { id: 'x', symbol: 'x', label: 'x', unit: '1', plausible: { min: 2, max: 1 } };
  expect(quantitySchema.safeParse(entry).success).toBe(false);
});
