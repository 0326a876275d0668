import { quantityById } from '../quantities/registry';
import type { Conditions, Reading } from '../record';
import { conditionWords } from '../rule-sets/words';
import { fittedQuantities } from './analysis-design';
import { type AnalysisNode, valueWith } from './analysis-node';
import type { ToPass } from './explanation';
import { type Judging, sideIn } from './to-pass-judging';
import { plausibleOf, said, search, stepOf } from './to-pass-search';
import type { UsableReading, World } from './world';

/** One value that a rule's value is made of: computed from raw readings, or a mean of readings as they are. */
export type Part = { kind: 'computed'; node: AnalysisNode } | ReadPart;

interface ReadPart {
  kind: 'read';
  quantity: string;
  at: Conditions;
  value: number;
  count: number;
  /** Trade symbol by which the rule speaks of it; else its label and conditions. */
  symbol?: string;
}

/** Every raw input of the parts, moved alone in all of them, nearest first in the order of what can be changed. */
export function waysOfParts(
  judging: Judging,
  parts: readonly Part[],
  combine: (values: readonly number[]) => number | null,
): ToPass[] {
  const ways = movables(judging.world, parts).flatMap((movable) => {
    const { quantity, present, unit, readings, count, name } = movable;
    const step = stepOf(judging.world, quantity, readings);
    const way = search({
      present,
      step,
      plausible: plausibleOf(judging.world, quantity),
      valueAt: (value) => {
        const values = parts.map((part) => valueOfPart(part, movable, value));
        return values.some((each) => each === null) ? null : combine(values.filter((each) => each !== null));
      },
      sideOf: (value) => sideIn(judging, value),
    });
    return way === null ? [] : [said({ quantity, unit, present, step, count, name, ...way })];
  });
  return inOrderOfChange(judging.world, ways);
}

/** A single mean of readings, moved as a whole. */
export function wayOfReadings(judging: Judging, part: ReadPart): ToPass[] {
  return waysOfParts(judging, [part], ([value = Number.NaN]) => value);
}

/** What can be changed: one measured result with every place where the parts use it. */
interface Movable {
  quantity: string;
  name: string;
  unit: string;
  present: number;
  count: number;
  readings: Reading[];
  nodes: Set<AnalysisNode>;
  parts: Set<Part>;
}

function movables(world: World, parts: readonly Part[]): Movable[] {
  const found = new Map<string, Movable>();
  const add = (movable: Movable) => {
    const key = keyOf(movable);
    const known = found.get(key);
    if (known === undefined) found.set(key, movable);
    else {
      for (const node of movable.nodes) known.nodes.add(node);
      for (const part of movable.parts) known.parts.add(part);
    }
  };
  for (const part of parts) {
    if (part.kind === 'read') {
      add(ofReadings(world, part));
      continue;
    }
    const { node } = part;
    const inputs = isOneResult(node) ? [node] : rawInputs(node, node.quantity);
    for (const input of inputs) {
      add({
        quantity: input.quantity,
        name: symbolOf(input),
        unit: input.unit,
        present: input.value,
        count: input.count ?? 1,
        readings: readingsOf(input),
        nodes: new Set([input]),
        parts: new Set(),
      });
    }
  }
  return [...found.values()];
}

function ofReadings(world: World, part: ReadPart): Movable {
  const { quantity, at, value: present, count } = part;
  const entry = world.view.quantity(quantity);
  const { trial: _trial, specimen, ...place } = at;
  const named = specimen === undefined || count > 1 ? place : { ...place, specimen };
  return {
    quantity,
    name: part.symbol ?? `${entry?.label ?? quantity}${conditionWords(named)}`,
    unit: entry?.unit ?? '1',
    present,
    count,
    readings: readingsAt(world, quantity, at).map(({ reading }) => reading),
    nodes: new Set(),
    parts: new Set([part]),
  };
}

function readingsAt(world: World, quantity: string, at: Conditions): UsableReading[] {
  return (world.readings.get(quantity) ?? []).filter(({ at: other }) => other === at);
}

/** The same result, wherever it is used. */
function keyOf({ quantity, readings, present }: Movable): string {
  const cells = readings.map(({ at, value, source }) => JSON.stringify([at, value, source]));
  return [quantity, present, ...cells.toSorted()].join(' ');
}

function valueOfPart(part: Part, { nodes, parts }: Movable, value: number): number | null {
  if (parts.has(part)) return value;
  return part.kind === 'read' ? part.value : valueWith(part.node, nodes, value);
}

/**
 * The nearest inputs that a laboratory measures and can change. Binder content is not among them for values that
 * change with the other readings of a trial: that answer is read from the trials. A blend's gravity is no single
 * reading; what belongs to the binder or is only weighed and gauged again is not changed.
 */
function rawInputs(node: AnalysisNode, of: string, found: AnalysisNode[] = []): AnalysisNode[] {
  for (const input of node.inputs) {
    if (isOneResult(input)) {
      const movesOthers = input.quantity === 'binder-content' && fittedQuantities.has(of);
      if (!movesOthers && !UNCHANGING.has(input.quantity) && !found.includes(input)) found.push(input);
    } else if (quantityById(input.quantity)?.kind === 'derived' && input.quantity !== 'surface-area') {
      rawInputs(input, of, found);
    }
  }
  return found;
}

const UNCHANGING = new Set([
  'binder-specific-gravity',
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'specimen-height',
  'specimen-diameter',
  'specimen-thickness',
  'gauge-length',
  'creep-load',
]);

/** A reading, the mean of replicates, or what is computed of masses and loads and spoken of as one result. */
function isOneResult({ formula, quantity }: AnalysisNode): boolean {
  return formula === null || formula.startsWith('mean of') || REPLICATED.has(quantity);
}

const REPLICATED = new Set([
  'percent-passing',
  'bulk-specific-gravity-mix',
  'maximum-specific-gravity',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
  'cracking-tolerance-index',
  'flexibility-index',
]);

function readingsOf(node: AnalysisNode): Reading[] {
  return node.reading !== null ? [node.reading] : node.inputs.flatMap(readingsOf);
}

function symbolOf({ symbol, at }: AnalysisNode): string {
  return `${symbol}${at.stockpile === undefined ? '' : ` of stockpile ${at.stockpile}`}`;
}

/**
 * First what a designer sets, the gradation; then what compaction and testing give; last what the materials bring.
 * Among equals by how far each has to go for its kind, in gauge spans.
 */
function inOrderOfChange(world: World, ways: readonly ToPass[]): ToPass[] {
  const spans = ({ quantity, present, from, to }: ToPass) => {
    const now = present ?? 0;
    const near = from !== null && from > now ? from : (to ?? now);
    return Math.abs(near - now) / (world.view.quantity(quantity)?.gaugeSpan ?? 1);
  };
  return ways.toSorted((a, b) => rankOf(a.quantity) - rankOf(b.quantity) || spans(a) - spans(b));
}

function rankOf(quantity: string): number {
  if (quantity === 'percent-passing' || quantity === 'binder-content') return 0;
  return MATERIALS.has(quantity) ? 2 : 1;
}

const MATERIALS = new Set([
  'maximum-specific-gravity',
  'bulk-specific-gravity-aggregate',
  'apparent-specific-gravity-aggregate',
  'effective-specific-gravity-aggregate',
  'water-absorption',
]);
