import type { Conditions, MixRecord, Reading } from '#rules/record';
import { countInFigures } from '#shared/format/numbers';

/** "binder content 5.1 to 5.3 %; 14 readings changed", or null where the records hold the same. */
export function changeSummary(previous: MixRecord, present: MixRecord): string | null {
  const parts = [
    ...binderContent(previous, present),
    ...attributes(previous, present),
    ...shares(previous, present),
    ...readingCounts(previous, present),
  ];
  return parts.length === 0 ? null : parts.join('; ');
}

function binderContent(previous: MixRecord, present: MixRecord): string[] {
  const before = designBinderContent(previous);
  const now = designBinderContent(present);
  return before === null || now === null || before === now ? [] : [`binder content ${before} to ${now} %`];
}

function designBinderContent(record: MixRecord): number | null {
  const reading = record.readings.find(
    ({ quantity, at }) => quantity === 'binder-content' && (at.trial ?? 'design') === 'design',
  );
  return reading?.value ?? null;
}

function attributes(previous: MixRecord, present: MixRecord): string[] {
  return Object.entries(present.attributes).flatMap(([name, { value }]) => {
    const before = previous.attributes[name]?.value;
    return before === undefined || before === value ? [] : [`${words(name)} ${before} to ${value}`];
  });
}

function shares(previous: MixRecord, present: MixRecord): string[] {
  const before = byPlace(previous.readings.filter(isShare));
  return present.readings.filter(isShare).flatMap((reading) => {
    const earlier = before.get(placeOf(reading))?.[0];
    if (earlier?.value == null || earlier.value === reading.value) return [];
    const blend = reading.at.blend === undefined ? '' : ` in blend ${reading.at.blend}`;
    return [`${reading.at.stockpile}${blend} ${earlier.value} to ${reading.value} %`];
  });
}

function isShare(reading: Reading): boolean {
  return reading.quantity === 'stockpile-share' && reading.at.stockpile !== undefined;
}

/** Readings are compared at their place (quantity and conditions); the cells they stand in may have moved. */
function readingCounts(previous: MixRecord, present: MixRecord): string[] {
  const before = byPlace(previous.readings);
  const now = byPlace(present.readings);
  let changed = 0;
  let added = 0;
  let gone = 0;
  for (const place of new Set([...before.keys(), ...now.keys()])) {
    const earlier = before.get(place) ?? [];
    const later = now.get(place) ?? [];
    const common = Math.min(earlier.length, later.length);
    for (let index = 0; index < common; index += 1) {
      if (writtenValue(earlier[index]) !== writtenValue(later[index])) changed += 1;
    }
    added += later.length - common;
    gone += earlier.length - common;
  }
  return [counted(changed, 'changed'), counted(added, 'new'), counted(gone, 'gone')].filter(
    (part) => part !== '',
  );
}

function counted(count: number, word: string): string {
  if (count === 0) return '';
  return `${countInFigures(count, 'reading')} ${word}`;
}

function byPlace(readings: readonly Reading[]): Map<string, Reading[]> {
  const places = new Map<string, Reading[]>();
  for (const reading of readings) {
    const place = placeOf(reading);
    const there = places.get(place);
    if (there === undefined) places.set(place, [reading]);
    else there.push(reading);
  }
  return places;
}

function placeOf({ quantity, at }: Reading): string {
  const conditions = (Object.keys(at) as (keyof Conditions)[]).sort().map((name) => `${name}=${at[name]}`);
  return [quantity, ...conditions].join('|');
}

function writtenValue(reading: Reading | undefined): string {
  return `${reading?.qualifier ?? ''}${reading?.value}`;
}

/** `nominalMaximumSize` as people write it. */
function words(name: string): string {
  return name.replace(/([A-Z])/g, ' $1').toLowerCase();
}
