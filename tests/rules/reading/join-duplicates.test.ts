import { describe, expect, it } from 'vitest';
import { joinReadings } from '#rules/reading/join-duplicates';
import { createReadingLog } from '#rules/reading/reading-log';

/** Air voids of the design, stated otherwise in every cell of column B. */
function logOf(count: number) {
  const log = createReadingLog([]);
  for (let row = 1; row <= count; row += 1) {
    const text = (3 + row / 10).toFixed(1);
    const place = { sheet: 'Summary', cell: `B${row}`, text };
    log.readings.push({
      place,
      taken: 'air voids',
      reading: {
        quantity: 'air-voids',
        value: Number(text),
        unit: '%',
        at: { trial: 'design' },
        origin: 'reported',
        source: place,
      },
    });
  }
  return log;
}

describe('values that differ for one thing', () => {
  it('are a doubt with every value to choose from, however many they are', () => {
    const log = logOf(13);
    expect(joinReadings(log)).toEqual([]);
    expect(log.doubts.map(({ cell }) => cell)).toEqual(['B13']);
    const offered = log.doubts[0]?.alternatives.map(({ answer }) => answer) ?? [];
    expect(offered.filter((answer) => answer.endsWith('%'))).toHaveLength(13);
  });

  it('are a logged series only past twelve, and only where no mapping says what they are', () => {
    const twelve = logOf(12);
    expect(joinReadings(twelve, { mayLog: true })).toEqual([]);
    expect(twelve.doubts).toHaveLength(1);
    const thirteen = logOf(13);
    expect(joinReadings(thirteen, { mayLog: true })).toEqual([]);
    expect(thirteen.doubts).toEqual([]);
  });
});
