import { Decimal } from 'decimal.js';
import { quantityById } from '../../quantities/registry';
import { conditionsKey, type ReadingLog, type TakenReading } from '../reading-log';
import { unreadReasons } from '../unread-reason';

/**
 * A summary repeats the mean of specimens that stand elsewhere. It is no further specimen, so it is passed over
 * where it agrees with them to its own digits.
 */
export function dropMeans(log: ReadingLog): void {
  const specimens = new Map<string, TakenReading[]>();
  for (const taken of log.readings) {
    const { specimen, ...rest } = taken.reading.at;
    if (specimen === undefined || taken.reading.value === null) continue;
    const key = `${taken.reading.quantity}|${conditionsKey(rest)}`;
    const group = specimens.get(key);
    if (group) group.push(taken);
    else specimens.set(key, [taken]);
  }
  log.readings = log.readings.filter((taken) => {
    const { quantity, at, value } = taken.reading;
    if (at.specimen !== undefined || value === null || quantityById(quantity)?.kind !== 'measured')
      return true;
    const group = specimens.get(`${quantity}|${conditionsKey(at)}`);
    if (!group || group.length < 2 || !isMeanOf(taken, group)) return true;
    log.passOver(taken.place, unreadReasons.average);
    return false;
  });
}

function isMeanOf(taken: TakenReading, group: TakenReading[]): boolean {
  const sum = group.reduce((total, { reading }) => total.plus(reading.value ?? 0), new Decimal(0));
  const decimals = /\.(\d+)/.exec(taken.place.text)?.[1]?.length ?? 0;
  const tolerance = new Decimal(10).pow(-decimals);
  return sum
    .div(group.length)
    .minus(taken.reading.value ?? 0)
    .abs()
    .lte(tolerance);
}
