import type { Conditions, Reading } from '../record';
import type { Where } from '../rule-sets/measure';
import { quantityPhrase } from '../rule-sets/words';
import type { RecomputedValue } from './analysis';
import type { Evidence } from './finding';
import { missingForComputing } from './missing-inputs';
import { notShown, type Obstacle, undecided } from './obstacle';
import { inScope } from './scope';
import { select } from './select';
import { madeForTests } from './specimens-of-tests';
import { withoutTestedSpecimens } from './tested-specimens';
import { unusableRetained } from './unusable-retained';
import { applyWhere } from './where';
import type { UsableReading, World } from './world';

/** One value that a statistic is taken over. */
export interface SampleItem {
  specimen: string | null;
  /** Null with the qualifiers `none` and `non-plastic`. */
  value: number | null;
  qualifier: Reading['qualifier'] | null;
  at: Conditions;
  evidence: Evidence;
}

/** The values that a rule judges, chosen as it demands. */
export interface Sample {
  items: SampleItem[];
  /** True where only the mean over `count` specimens is known, standing as one item. */
  meanOnly: boolean;
  count: number;
  interpolated: boolean;
  recomputed: RecomputedValue | null;
}

export interface SampleRequest {
  quantity: string;
  /** Conditions of the rule and of its subject. */
  at: Conditions;
  where?: Where[] | undefined;
  /** True where the recomputed value itself is asked for, to be compared with the stated one. */
  toCompare?: boolean;
}

export type SampleResult = { ok: true; sample: Sample } | Obstacle;

/**
 * Which value is judged: a derived quantity as recomputed from its own raw readings, or interpolated, where the
 * analysis could; else the readings as they are.
 */
export function takeSample(world: World, request: SampleRequest): SampleResult {
  const isFiltered = request.where !== undefined && request.where.length > 0;
  if (isFiltered || request.toCompare) return explainedSample(world, request);
  const key = `${request.quantity} ${JSON.stringify(request.at)}`;
  const kept = world.samples.get(key);
  if (kept) return kept;
  const result = explainedSample(world, request);
  world.samples.set(key, result);
  return result;
}

/** Where nothing is shown, with what is missing for computing it. */
function explainedSample(world: World, request: SampleRequest): SampleResult {
  const taken = chooseSample(world, request);
  if (taken.ok || taken.outcome !== 'not shown') return taken;
  const missing = missingForComputing(world, request, (other) => chooseSample(world, other).ok);
  return missing === null ? taken : { ...taken, reason: `${taken.reason} ${missing}` };
}

function chooseSample(world: World, request: SampleRequest): SampleResult {
  const recomputed = takeRecomputed(world, request);
  const read = takeReadings(world, request);
  if (read.ok && statedCounts(world, request, recomputed)) return filtered(world, request, read.sample);
  if (recomputed?.ok) return filtered(world, request, recomputed.sample);
  if (read.ok) return filtered(world, request, read.sample);
  return recomputed?.outcome === 'undecided' ? recomputed : read;
}

/**
 * A measured property of the blend counts as stated and is only else computed from the stockpiles. Where the two
 * contradict each other the computed one is taken, so that both are looked at.
 */
function statedCounts(world: World, request: SampleRequest, recomputed: SampleResult | null): boolean {
  const quantity = world.view.quantity(request.quantity);
  if (request.toCompare || quantity?.kind === 'derived' || quantity?.subject !== 'aggregate') return false;
  return !(recomputed?.ok && recomputed.sample.recomputed?.agrees === false);
}

export function labelOfRequest(world: World, { quantity, at }: SampleRequest): string {
  const entry = world.view.quantity(quantity);
  const { trial: _trial, stockpile, ...others } = at;
  const rest = stockpile === undefined || stockpile === 'each' ? others : { ...others, stockpile };
  return entry ? quantityPhrase(entry, rest) : quantity;
}

/** Without conditions: the reason names the one that is not met. */
function bareLabel(world: World, { quantity }: SampleRequest): string {
  return world.view.quantity(quantity)?.label ?? quantity;
}

function takeRecomputed(world: World, request: SampleRequest): SampleResult | null {
  const all = world.recomputed.get(request.quantity) ?? [];
  const isGradation = request.quantity === 'percent-passing' && !request.toCompare;
  const isDesignGradation = isGradation && request.at.stockpile === undefined;
  // The job-mix gradation is what the workbook states, as passing or as retained; the blend recomputed from the
  // stockpiles is only compared with it.
  const candidates = isDesignGradation ? all.filter(({ origin }) => origin === 'converted') : all;
  const open = isGradation ? unusableRetained(world, request.at) : null;
  if (open !== null) return open;
  if (candidates.length === 0) return null;
  const label = bareLabel(world, request);
  const scope = { world, quantity: request.quantity, label, wanted: request.at, candidates };
  const inside = inScope(scope);
  if (!inside.ok) return inside;
  const selected = select({ world, candidates: inside.chosen, wanted: request.at, label, preferPlain: true });
  if (!selected.ok) return selected;
  const ofTests = madeForTests(request.quantity, request.at, selected.chosen, label);
  if (ofTests !== null) return ofTests;
  const whole = selected.chosen.filter(
    ({ at }) => at.specimen === undefined || request.at.specimen !== undefined,
  );
  const [value, ...others] = whole;
  if (others.length > 0)
    return undecided(
      `There are several values of ${label}, and nothing says which one counts.`,
      `Leave one value of ${label}, or say what tells them apart.`,
    );
  return { ok: true, sample: value ? sampleOfRecomputed(value) : sampleOfSpecimens(selected.chosen) };
}

/** Values that the analysis gives for single specimens only. */
function sampleOfSpecimens(values: RecomputedValue[]): Sample {
  const items = values
    .map(
      (value): SampleItem => ({
        specimen: value.at.specimen ?? null,
        value: value.value,
        qualifier: null,
        at: value.at,
        evidence: evidenceOfRecomputed(value),
      }),
    )
    .toSorted(bySpecimenLabel);
  const interpolated = values.some(({ origin }) => origin === 'interpolated');
  return { items, meanOnly: false, count: items.length, interpolated, recomputed: null };
}

function sampleOfRecomputed(value: RecomputedValue): Sample {
  const evidence = evidenceOfRecomputed(value);
  const interpolated = value.origin === 'interpolated';
  const base = { interpolated, recomputed: value };
  if (interpolated || value.specimens.length === 0) {
    const item: SampleItem = { specimen: null, value: value.value, qualifier: null, at: value.at, evidence };
    return {
      ...base,
      items: [item],
      meanOnly: interpolated || value.count > 1,
      count: Math.max(1, value.count),
    };
  }
  const items = value.specimens.map(
    (each): SampleItem => ({
      specimen: each.specimen,
      value: each.value,
      qualifier: null,
      at: { ...value.at, specimen: each.specimen },
      evidence,
    }),
  );
  return { ...base, items, meanOnly: false, count: items.length };
}

export function evidenceOfRecomputed(value: RecomputedValue): Evidence {
  const { reported } = value;
  return {
    quantity: value.quantity,
    value: value.value,
    unit: value.unit,
    at: value.at,
    origin: value.origin,
    formula: value.formula,
    symbol: value.symbol,
    ...(reported && reported.value !== null
      ? {
          reported: {
            value: reported.value,
            text: reported.source?.text ?? String(reported.value),
            source: reported.source,
          },
        }
      : {}),
    inputs: value.inputs,
    source: null,
  };
}

function takeReadings(world: World, request: SampleRequest): SampleResult {
  const candidates = world.readings.get(request.quantity) ?? [];
  const label = bareLabel(world, request);
  const inside = inScope({ world, quantity: request.quantity, label, wanted: request.at, candidates });
  if (!inside.ok) return inside;
  const isDerived = world.view.quantity(request.quantity)?.kind === 'derived';
  const untested = withoutTestedSpecimens(world, request.quantity, inside.chosen);
  const selected = select({ world, candidates: untested, wanted: request.at, label, preferPlain: isDerived });
  if (!selected.ok) return selected;
  const ofTests = madeForTests(request.quantity, request.at, selected.chosen, label);
  if (ofTests !== null) return ofTests;
  const faulty = selected.chosen.find((each) => each.fault !== null);
  if (faulty)
    return undecided(
      `A reading of ${label}${placeWords(faulty.reading)} cannot be used: ${faulty.fault}.`,
      'Give it as a number in a unit of that quantity.',
    );
  const labelled = selected.chosen.filter(({ at }) => at.specimen !== undefined);
  // A value without a specimen beside values with one is their stated mean, not one more of them.
  return replicates(labelled.length > 0 ? labelled : selected.chosen, label);
}

function replicates(readings: UsableReading[], label: string): SampleResult {
  const bySpecimen = new Map<string, UsableReading>();
  for (const each of readings) {
    const key = each.at.specimen ?? '';
    const earlier = bySpecimen.get(key);
    if (earlier === undefined) bySpecimen.set(key, each);
    else if (earlier.value !== each.value || earlier.reading.qualifier !== each.reading.qualifier) {
      const of = key === '' ? '' : ` of specimen ${key}`;
      return undecided(
        `Two readings of ${label}${of} disagree${placeWords(earlier.reading)}${placeWords(each.reading, ' and')}; label replicates as specimens, or correct one.`,
        'Correct one of the two, or label them as specimens.',
      );
    }
  }
  const items = [...bySpecimen.values()].map(itemOfReading).toSorted(bySpecimenLabel);
  return {
    ok: true,
    sample: { items, meanOnly: false, count: items.length, interpolated: false, recomputed: null },
  };
}

function itemOfReading(usable: UsableReading): SampleItem {
  const { reading, value, at } = usable;
  return {
    specimen: at.specimen ?? null,
    value,
    qualifier: reading.qualifier ?? null,
    at,
    evidence: evidenceOfReading(reading),
  };
}

export function evidenceOfReading(reading: Reading): Evidence {
  const isWord = reading.qualifier === 'none' || reading.qualifier === 'non-plastic';
  const text = isWord
    ? reading.qualifier
    : reading.qualifier
      ? `${reading.qualifier}${reading.value}`
      : undefined;
  return {
    quantity: reading.quantity,
    value: reading.value !== null && Number.isFinite(reading.value) ? reading.value : null,
    ...(text === undefined ? {} : { text }),
    unit: reading.unit,
    at: reading.at,
    origin: reading.origin,
    ...(reading.method === undefined ? {} : { method: reading.method }),
    source: reading.source,
  };
}

function filtered(world: World, request: SampleRequest, sample: Sample): SampleResult {
  if (request.where === undefined || request.where.length === 0) return { ok: true, sample };
  const kept = applyWhere(world, request, sample);
  if (!kept.ok) return kept;
  if (kept.items.length === 0) {
    return notShown(
      `No specimen of ${labelOfRequest(world, request)} meets the conditions under which it counts.`,
    );
  }
  const count = sample.meanOnly ? sample.count : kept.items.length;
  const isWhole = kept.items.length === sample.items.length;
  // With specimens left out the analysis' mean is no longer the mean of what counts.
  return {
    ok: true,
    sample: { ...sample, items: kept.items, count, recomputed: isWhole ? sample.recomputed : null },
  };
}

function placeWords(reading: Reading, joint = ''): string {
  if (reading.source === null) return '';
  const sheet = reading.source.sheet === '' ? '' : `${reading.source.sheet} `;
  return `${joint} (${sheet}${reading.source.cell})`;
}

function bySpecimenLabel(left: SampleItem, right: SampleItem): number {
  const a = left.specimen ?? '';
  const b = right.specimen ?? '';
  return a < b ? -1 : a > b ? 1 : 0;
}
