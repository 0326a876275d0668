import { Decimal } from 'decimal.js';
import type { AttributeValue, Reading } from '../record';
import { conditionsKey, type Place, type ReadingLog, type TakenReading } from './reading-log';
import { doubtOf } from './settled';
import { unreadReasons } from './unread-reason';

/**
 * One reading of one quantity under the same conditions: equal ones are one, unequal ones are a doubt. Only where the
 * meaning of a place was found out, not told by a mapping, may a long series be taken for what a machine logged.
 */
export function joinReadings(log: ReadingLog, { mayLog = false } = {}): Reading[] {
  const groups = new Map<string, TakenReading[]>();
  for (const taken of log.readings) {
    const key = `${taken.reading.quantity}|${conditionsKey(taken.reading.at)}`;
    const group = groups.get(key);
    if (group) group.push(taken);
    else groups.set(key, [taken]);
  }
  return [...groups.values()].flatMap((group) => {
    const distinct = distinctOf(group, mayLog ? mostAlternatives + 1 : Number.POSITIVE_INFINITY);
    if (mayLog && distinct.length > mostAlternatives) return passOverSeries(log, group);
    const [only] = distinct;
    if (distinct.length === 1 && only) {
      for (const { place, taken } of group) log.use(place, 'read', taken);
      return [only.reading];
    }
    return settleConflict(log, group, distinct);
  });
}

/** So many values of one thing are what a machine logged, and no statement of a result. */
function passOverSeries(log: ReadingLog, group: TakenReading[]): Reading[] {
  for (const { place } of group) log.passOver(place, unreadReasons.rawData);
  return [];
}

/** Values that differ beyond their displayed digits; of two that agree the finer one stands. */
function distinctOf(group: TakenReading[], most: number): TakenReading[] {
  const distinct: TakenReading[] = [];
  for (const taken of group) {
    if (distinct.length >= most) break;
    const at = distinct.findIndex((known) => agree(known, taken));
    const known = distinct[at];
    if (!known) distinct.push(taken);
    else if (
      known.reading.value !== taken.reading.value &&
      decimalsOf(taken.place) > decimalsOf(known.place)
    ) {
      distinct[at] = taken;
    }
  }
  return distinct;
}

function agree(a: TakenReading, b: TakenReading): boolean {
  const [first, second] = [a.reading, b.reading];
  if (first.qualifier !== second.qualifier) return false;
  if (first.value === null || second.value === null) return first.value === second.value;
  if (first.value === second.value) return true;
  if (first.origin !== 'reported' || second.origin !== 'reported') return false;
  const decimals = Math.min(decimalsOf(a.place), decimalsOf(b.place));
  const halfUnit = new Decimal(10).pow(-decimals).div(2);
  return new Decimal(first.value).minus(second.value).abs().lte(halfUnit);
}

function decimalsOf(place: Place): number {
  return /\.(\d+)/.exec(place.text)?.[1]?.length ?? 0;
}

/** More choices than anybody reads. */
const mostAlternatives = 12;

function settleConflict(log: ReadingLog, group: TakenReading[], distinct: TakenReading[]): Reading[] {
  const last = group.at(-1) as TakenReading;
  const first = distinct.find((taken) => taken.place !== last.place) as TakenReading;
  const { quantity, at } = last.reading;
  const reason = `says ${last.place.text} where ${whereOf(first.place, last.place)} says ${first.place.text} for the same thing`;
  const alternatives = distinct.map((taken) => ({
    answer: `${taken.reading.value} ${taken.reading.unit}`,
    label: `${taken.place.text}, as in ${whereOf(taken.place, last.place)}`,
    value: taken,
  }));
  const settled = log.settle(last.place, doubtOf(reason, alternatives), { quantity, at }, ({ reading }) => ({
    reading,
  }));
  if (settled.state === 'value') {
    for (const { place, taken } of group) log.use(place, 'read', taken);
    return [settled.value.reading];
  }
  for (const { place } of group) {
    if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
    else log.use(place, 'doubt', `Two values for the same thing; see ${whereOf(last.place, place)}.`);
  }
  return [];
}

/** One value of one attribute; two that differ are a doubt at the later cell. */
export function joinAttributes(log: ReadingLog): Record<string, AttributeValue> {
  const joined: Record<string, AttributeValue> = {};
  const names = [...new Set(log.attributes.map(({ name }) => name))];
  for (const name of names) {
    const group = log.attributes.filter((each) => each.name === name);
    const distinct = group.filter(
      (each, at) => group.findIndex(({ value }) => value.value === each.value.value) === at,
    );
    const last = group.at(-1);
    const [first] = distinct;
    if (!last || !first) continue;
    if (distinct.length === 1) {
      joined[name] = first.value;
      continue;
    }
    const alternatives = distinct.map((each) => ({
      answer: String(each.value.value),
      label: `${each.place.text}, as in ${whereOf(each.place, last.place)}`,
      value: each.value,
    }));
    const reason = `says ${last.place.text} where ${whereOf(first.place, last.place)} says ${first.place.text}`;
    const settled = log.settle(last.place, doubtOf(reason, alternatives), { attribute: name }, (value) => ({
      attribute: { name, value },
    }));
    if (settled.state === 'value') joined[name] = settled.value;
  }
  return joined;
}

function whereOf(place: Place, from: Place): string {
  return place.sheet === from.sheet || place.sheet === '' ? place.cell : `${place.sheet} ${place.cell}`;
}
