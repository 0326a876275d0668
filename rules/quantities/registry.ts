import { additiveQuantities } from './additive-quantities';
import { aggregateQuantities } from './aggregate-quantities';
import { aggregateTestQuantities } from './aggregate-test-quantities';
import { binderQuantities } from './binder-quantities';
import { binderTestQuantities } from './binder-test-quantities';
import { compactionQuantities } from './compaction-quantities';
import { creepQuantities } from './creep-quantities';
import { gradationQuantities } from './gradation-quantities';
import { massQuantities } from './mass-quantities';
import { mixTestQuantities } from './mix-test-quantities';
import { moistureQuantities } from './moisture-quantities';
import { performanceQuantities } from './performance-quantities';
import { productionQuantities } from './production-quantities';
import { type Quantity, quantitySchema } from './quantity';
import { recycledQuantities } from './recycled-quantities';
import { volumetricQuantities } from './volumetric-quantities';

/** The entry of an id, or undefined where the registry has none. */
export function quantityById(id: string): Quantity | undefined {
  return byId.get(id);
}

export function allQuantities(): Quantity[] {
  return quantities;
}

const quantities: Quantity[] = [
  ...volumetricQuantities,
  ...compactionQuantities,
  ...massQuantities,
  ...aggregateQuantities,
  ...gradationQuantities,
  ...binderQuantities,
  ...moistureQuantities,
  ...performanceQuantities,
  ...recycledQuantities,
  ...creepQuantities,
  ...binderTestQuantities,
  ...mixTestQuantities,
  ...aggregateTestQuantities,
  ...additiveQuantities,
  ...productionQuantities,
].map((entry) => {
  const quantity = quantitySchema.parse(entry);
  return quantity.acceptedUnits.length > 0 ? quantity : { ...quantity, acceptedUnits: [quantity.unit] };
});

const byId = new Map(quantities.map((quantity) => [quantity.id, quantity]));
