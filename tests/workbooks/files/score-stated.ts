import type { ReadingResult } from '#rules/reading/reading-result';
import type { Conditions, Reading } from '#rules/record';
import { type Score, scoreFacts } from '../layouts/score';
import { Namings } from './namings';
import type { StatedReading, StatedTruth } from './stated-truth';

/**
 * What was read against what is stated. The same fact at several cells counts once; where the workbook gives no
 * names, or several, those that a reader gives need only tell places apart.
 */
export function scoreStated(result: Pick<ReadingResult, 'record' | 'doubts'>, truth: StatedTruth): Score {
  const namings = new Namings(result.record.readings, [...truth.readings, ...truth.optional]);
  const keys = new Set(truth.readings.map(factKey));
  const found = new Set<string>();
  const extra: string[] = [];
  for (const reading of result.record.readings) {
    const isSame = (each: StatedReading) => sameResult(each, reading) && namings.sameAt(each, reading.at);
    const hit = [truth.readings, truth.optional].flatMap((list) => list.filter(isSame));
    if (hit.length === 0) extra.push(`${told(reading)} not ${statedAt(truth, reading)}`);
    for (const each of hit) found.add(factKey(each));
  }
  const missing = truth.readings.filter((each) => !found.has(factKey(each)));
  const facts = scoreFacts(result, {
    attributes: truth.attributes,
    documents: truth.documents.map(({ type, date, validTo }) => ({
      type,
      date: date ?? null,
      validTo: validTo ?? null,
    })),
  });
  return {
    expected: keys.size + facts.expected,
    found: [...keys].filter((key) => found.has(key)).length + facts.found,
    wrong: extra.length + facts.extra.length,
    doubts: result.doubts.length,
    missing: [
      ...missing.map(
        (each) => `${each.sheet}!${each.cell} ${each.quantity} ${atText(each.at)} = ${each.value}`,
      ),
      ...facts.missing,
    ],
    extra: [...extra, ...facts.extra],
  };
}

function sameResult(stated: StatedReading, { quantity, value, unit, qualifier }: Reading): boolean {
  if (stated.quantity !== quantity || stated.unit !== unit || stated.qualifier !== qualifier) return false;
  if (stated.value === null || value === null) return stated.value === value;
  return Math.abs(stated.value - value) <= 1e-6 * Math.max(1, Math.abs(stated.value));
}

function statedAt(truth: StatedTruth, { source, quantity }: Reading): string {
  const there = [...truth.readings, ...truth.optional].filter(
    ({ sheet, cell }) => sheet === source?.sheet && cell === source?.cell,
  );
  const [stated] = [...there.filter((each) => each.quantity === quantity), ...there];
  return stated ? `${stated.quantity} ${atText(stated.at)} = ${stated.value}` : 'a reading';
}

function told({ quantity, value, unit, at, qualifier, source }: Reading): string {
  return `${source?.sheet}!${source?.cell} ${quantity} ${atText(at)} = ${qualifier ?? ''}${value} ${unit}`;
}

function atText(at: Conditions): string {
  return `[${Object.entries(at)
    .map(([name, value]) => `${name} ${value}`)
    .join(', ')}]`;
}

function factKey({ quantity, qualifier, at }: StatedReading): string {
  const { trial, ...rest } = at;
  const named = trial === undefined || trial === 'design' ? rest : at;
  return JSON.stringify([quantity, qualifier, Object.entries(named).sort(([a], [b]) => (a < b ? -1 : 1))]);
}
