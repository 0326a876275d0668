import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { Statistic } from '../rule-sets/measure';
import { andList, computedWords, withUnit } from '../rule-sets/words';
import type { RecomputedValue } from './analysis';
import type { ResolvedLimit } from './finding';
import { judge, type Rounder } from './judge';
import { AGREE_WORDS } from './obstacle';
import type { Sample } from './sample';
import type { World } from './world';

interface ReportedInput {
  world: World;
  quantity: string;
  statistic: Statistic;
  sample: Sample;
  limit: ResolvedLimit;
  rounder: Rounder;
  outcome: 'pass' | 'fail' | 'undecided';
}

/**
 * What the workbook's own value says beside the recomputed one. Where the two differ beyond the tolerance and
 * give different outcomes, neither stands, unless exactly one named cause explains the reported value.
 */
export function againstReported(
  input: ReportedInput,
): { contradicts: boolean; reason: string; wouldDecide?: string } | null {
  const { sample, limit, rounder, statistic, outcome, world, quantity } = input;
  const { recomputed } = sample;
  const isOfMean = statistic === 'mean' || (sample.count === 1 && statistic !== 'count');
  if (recomputed === null || recomputed.reported === null || !isOfMean) return null;
  const { reported, agrees, cause } = recomputed;
  if (agrees !== false || reported.value === null) return null;
  const unit = world.view.quantity(quantity)?.unit ?? limit.unit;
  const stated = convert(reported.value, reported.unit, unit);
  const own = stated.ok ? convert(stated.value, unit, limit.unit) : stated;
  if (!own.ok) return null;
  const asReported = judge({ value: own.value, text: null, allowed: null }, limit, rounder);
  const place = reported.source
    ? ` (${reported.source.sheet === '' ? '' : `${reported.source.sheet} `}${reported.source.cell})`
    : '';
  const values = `The workbook reports ${withUnit(inDecimals(own.value, limit, rounder), limit.unit)}${place}; recomputed it is ${asWritten(input)}.`;
  if (asReported.outcome === outcome)
    return { contradicts: false, reason: `${values} Both give the same outcome.` };
  world.contradicted.add(recomputedOfRecord(input));
  if (cause !== null) {
    return {
      contradicts: false,
      reason: `${values} ${subjectWords(place, reported.source)} ${cause.text}, so the recomputed value is judged.`,
    };
  }
  return {
    contradicts: true,
    reason: `${values} The two give different outcomes, and no single cause explains the difference; correct the raw readings or the reported value.`,
    wouldDecide: `Correct the raw readings, or the reported value${place}, so that the two agree.`,
  };
}

/**
 * Specimens of which the workbook reports another value than their own raw readings give. Where the rule comes to
 * another outcome with what is reported, neither stands, unless a named cause explains each of them.
 */
export function specimensReportedOtherwise(
  world: World,
  quantity: string,
  sample: Sample,
  isSameOutcome: (other: Sample) => boolean,
): { contradicts: boolean; reason: string; wouldDecide?: string } | null {
  if (sample.recomputed === null || sample.items.length < 2) return null;
  const differing = (world.recomputed.get(quantity) ?? []).filter(
    ({ at, agrees }) => agrees === false && sample.items.some((item) => isSameSpecimen(item.at, at)),
  );
  const items = sample.items.map((item) => {
    const stated = differing.find(({ at }) => isSameSpecimen(item.at, at))?.reported ?? null;
    if (stated === null || stated.value === null) return item;
    const own = convert(stated.value, stated.unit, world.view.quantity(quantity)?.unit ?? stated.unit);
    return own.ok ? { ...item, value: own.value } : item;
  });
  if (differing.length === 0 || isSameOutcome({ ...sample, items })) return null;
  for (const value of differing) world.contradicted.add(value);
  const specimens = andList(differing.map(({ at }) => `specimen ${at.specimen}`));
  const causes = new Set(differing.map(({ cause }) => cause?.text ?? null));
  return causes.has(null)
    ? {
        contradicts: true,
        reason: `The workbook reports other values of ${specimens} than their raw readings give. The two give different outcomes; correct the raw readings or the reported values.`,
        wouldDecide: AGREE_WORDS,
      }
    : {
        contradicts: false,
        reason: `The reported values of ${specimens} ${[...causes].join(' and ')}, so the recomputed ones are judged.`,
      };
}

function isSameSpecimen(item: Conditions, other: Conditions): boolean {
  if (item.specimen === undefined || item.specimen !== other.specimen) return false;
  const names = [...Object.keys(item), ...Object.keys(other)] as (keyof Conditions)[];
  return names.every((name) => item[name] === other[name]);
}

/** The analysis' own object, also where the sample holds it in another unit. */
function recomputedOfRecord({ world, quantity, sample }: ReportedInput): RecomputedValue {
  const used = sample.recomputed as RecomputedValue;
  return (world.recomputed.get(quantity) ?? []).find(({ reported }) => reported === used.reported) ?? used;
}

function subjectWords(place: string, source: { cell: string } | null): string {
  return place === '' || source === null ? 'The reported value' : source.cell;
}

function asWritten({ sample, limit, rounder }: ReportedInput): string {
  const value = sample.recomputed?.value ?? Number.NaN;
  return withUnit(inDecimals(value, limit, rounder), limit.unit);
}

function inDecimals(value: number, limit: ResolvedLimit, rounder: Rounder): string {
  return computedWords(value, Math.max(rounder.decimals, limit.decimals));
}
