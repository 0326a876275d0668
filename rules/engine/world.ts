import { convert } from '../quantities/units';
import type { CheckContext, Conditions, MixRecord, Reading } from '../record';
import type { EditionView } from '../rule-sets/edition-view';
import { viewOf } from '../rule-sets/edition-view';
import type { ResolvedEdition, ResolvedTable } from '../rule-sets/resolve';
import type { Analysis, RecomputedValue } from './analysis';
import type { Fact } from './decide';
import type { RowResult } from './look-up';
import type { Obstacle } from './obstacle';
import type { SampleResult } from './sample';

/** A reading as the engine uses it: in the canonical unit, or with the reason why it cannot be used. */
export interface UsableReading {
  reading: Reading;
  at: Conditions;
  value: number | null;
  fault: string | null;
}

/** Readings by quantity; each quantity is made ready when a rule first asks for it. */
export interface UsableReadings {
  get(quantity: string): UsableReading[] | undefined;
}

/** Everything that the rules of one check look at, indexed once. */
export interface World {
  record: MixRecord;
  edition: ResolvedEdition;
  view: EditionView;
  context: CheckContext;
  analysis: Analysis;
  readings: UsableReadings;
  recomputed: Map<string, RecomputedValue[]>;
  /** The blend that the job mix names, `several` where it does not say which of several. */
  designBlend: string | null | 'several';
  tables: ReadonlyMap<string, ResolvedTable>;
  /** Attributes as far as they have been asked for. */
  facts: Map<string, Fact>;
  /** Samples and table rows as far as they have been asked for: many rules look at the same ones. */
  samples: Map<string, SampleResult>;
  rows: Map<string, RowResult>;
  /** Findings that an unanswered doubt could turn, by key, each with the reason. */
  unsettled: ReadonlyMap<string, Obstacle>;
  /** Filled while rules are judged: computed values whose reported counterpart has another outcome. */
  contradicted: Set<RecomputedValue>;
}

export function worldOf(input: {
  record: MixRecord;
  edition: ResolvedEdition;
  context: CheckContext;
  analysis: Analysis;
  unsettled?: ReadonlyMap<string, Obstacle>;
}): World {
  const view = viewOf(input.edition);
  const recomputed = new Map<string, RecomputedValue[]>();
  for (const value of input.analysis.recomputed) push(recomputed, value.quantity, value);
  return {
    unsettled: new Map(),
    ...input,
    view,
    readings: usableReadings(input.record, view),
    recomputed,
    designBlend: designBlendOf(input.record),
    tables: new Map(input.edition.tables.map((table) => [table.id, table])),
    facts: new Map(),
    samples: new Map(),
    rows: new Map(),
    contradicted: new Set(),
  };
}

function usableReadings(record: MixRecord, view: EditionView): UsableReadings {
  const stated = new Map<string, Reading[]>();
  for (const reading of record.readings) push(stated, reading.quantity, reading);
  const ready = new Map<string, UsableReading[]>();
  return {
    get: (quantity) => {
      const kept = ready.get(quantity);
      if (kept) return kept;
      const unit = view.quantity(quantity)?.unit;
      const readings = stated.get(quantity)?.map((reading) => usable(reading, unit ?? reading.unit));
      if (readings) ready.set(quantity, readings);
      return readings;
    },
  };
}

function usable(reading: Reading, unit: string): UsableReading {
  const base = { reading, at: reading.at };
  if (reading.value === null) {
    const isWord = reading.qualifier === 'none' || reading.qualifier === 'non-plastic';
    return { ...base, value: null, fault: isWord ? null : 'the reading has no number' };
  }
  if (!Number.isFinite(reading.value)) return { ...base, value: null, fault: 'the reading is not a number' };
  if (reading.unit === unit) return { ...base, value: reading.value, fault: null };
  const converted = convert(reading.value, reading.unit, unit);
  return converted.ok
    ? { ...base, value: converted.value, fault: null }
    : { ...base, value: null, fault: converted.reason };
}

/** A blend named by a reading of the proposed job mix formula. */
function designBlendOf(record: MixRecord): World['designBlend'] {
  const named = new Set<string>();
  for (const { at } of record.readings) {
    if (at.trial === 'design' && at.blend !== undefined) named.add(at.blend);
  }
  if (named.size > 1) return 'several';
  return [...named][0] ?? null;
}

function push<T>(map: Map<string, T[]>, key: string, entry: T): void {
  const list = map.get(key);
  if (list) list.push(entry);
  else map.set(key, [entry]);
}
