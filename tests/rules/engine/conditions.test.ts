import { describe, expect, it } from 'vitest';
import type { Conditions } from '#rules/record';
import { aReading } from '#tests/builders/a-reading';
import { findingOf, findingsOf } from './check-with';

const depth = 'wheel-track-rut-depth';

function outcomeFor(wanted: Conditions, stated: Conditions[], quantity = depth) {
  const rule = { measure: { kind: 'reading' as const, quantity, at: wanted }, limit: { max: 12.5 } };
  const readings = stated.map((at, i) =>
    aReading({ quantity, value: 5 + i / 10, at: { trial: 'design', specimen: String(i + 1), ...at } }),
  );
  return findingOf({ rule, record: { readings } });
}

describe('a condition that the rule names', () => {
  it.each([
    ['temperature', 50, 50.5, 'pass'],
    ['temperature', 50, 49.5, 'pass'],
    ['temperature', 50, 50.51, 'not shown'],
    ['time', 100, 101, 'pass'],
    ['time', 100, 99, 'pass'],
    ['time', 100, 101.1, 'not shown'],
    ['passes', 20000, 20000, 'pass'],
    ['passes', 20000, 20001, 'not shown'],
    ['stress', 100, 100, 'pass'],
    ['stress', 100, 100.1, 'not shown'],
    ['frequency', 10, 10, 'pass'],
    ['frequency', 10, 25, 'not shown'],
    ['variant', 'sodium', 'sodium', 'pass'],
    ['variant', 'sodium', 'magnesium', 'not shown'],
    ['aging', 'short', 'short', 'pass'],
    ['aging', 'short', 'none', 'not shown'],
  ] as const)('%s %s against a reading at %s: %s', (name, wanted, stated, outcome) => {
    expect(outcomeFor({ [name]: wanted }, [{ [name]: stated }]).outcome).toBe(outcome);
  });

  it('does not count readings that lack it, where others have it', () => {
    const finding = outcomeFor({ temperature: 50 }, [{ temperature: 50 }, {}]);
    expect(finding).toMatchObject({ outcome: 'pass', observed: { count: 1 } });
  });

  it('leaves the rule undecided where only readings that lack it exist', () => {
    const finding = outcomeFor({ temperature: 50 }, [{}, {}]);
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toBe(
      'Readings of wheel-track rut depth do not say whether they were obtained at 50 °C.',
    );
  });

  it('leaves the rule undecided where some lack it and the others have another value', () => {
    expect(outcomeFor({ temperature: 50 }, [{}, { temperature: 60 }]).outcome).toBe('undecided');
  });

  it('is not shown where every reading has another value, and says which', () => {
    const finding = outcomeFor({ temperature: 50 }, [{ temperature: 40 }, { temperature: 60 }]);
    expect(finding.outcome).toBe('not shown');
    expect(finding.reason).toBe(
      'There is no reading of wheel-track rut depth at 50 °C, only at 40 °C or at 60 °C.',
    );
  });
});

describe('a condition that the rule leaves unnamed', () => {
  it('does not matter where every reading has the same value', () => {
    expect(outcomeFor({}, [{ temperature: 50 }, { temperature: 50.4 }]).outcome).toBe('pass');
  });

  it('leaves the rule undecided where the readings hold several values', () => {
    const finding = outcomeFor({}, [{ temperature: 40 }, { temperature: 50 }]);
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('differ in temperature');
  });

  it('never splits by specimen', () => {
    expect(outcomeFor({}, [{}, {}, {}])).toMatchObject({ outcome: 'pass', observed: { count: 3 } });
  });
});

describe('gyrations', () => {
  const density = 'relative-density';
  const stated = (value: number) =>
    aReading({ quantity: 'gyrations-initial', value, at: { trial: 'design' } });
  const check = (wanted: Conditions['gyrations'], at: Conditions['gyrations'], numbers: number[] = []) => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: density, at: { gyrations: wanted } },
      limit: { max: 89 },
    };
    const readings = [
      aReading({ quantity: density, value: 88, at: { trial: 'design', gyrations: at } }),
      ...numbers.map(stated),
    ];
    return findingOf({ rule, record: { readings } });
  };

  it.each([
    ['a name and the same name', 'initial', 'initial', [], 'pass'],
    ['a name and another name', 'initial', 'maximum', [], 'not shown'],
    ['a number and the same number', 8, 8, [], 'pass'],
    ['a number and another number', 8, 100, [], 'not shown'],
    ['a name and the number stated for it', 'initial', 8, [8], 'pass'],
    ['a name and another number than the one stated for it', 'initial', 100, [8], 'not shown'],
    ['a number and the name it is stated for', 8, 'initial', [8], 'pass'],
    ['a name and a number, where no number is stated for the name', 'initial', 8, [], 'undecided'],
  ] as const)('%s', (_, wanted, at, numbers, outcome) => {
    expect(check(wanted, at, [...numbers]).outcome).toBe(outcome);
  });

  it('are undecided by two numbers stated for one name', () => {
    const readings = [
      aReading({ quantity: density, value: 88, at: { trial: 'design', gyrations: 8 } }),
      stated(8),
      aReading({ quantity: 'gyrations-initial', value: 9, at: { trial: 'design' } }),
    ];
    const rule = {
      measure: { kind: 'reading' as const, quantity: density, at: { gyrations: 'initial' as const } },
      limit: { max: 89 },
    };
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
  });
});

describe('sieves', () => {
  it('give one finding each where the rule names none', () => {
    const rule = { measure: { kind: 'reading' as const, quantity: 'percent-passing' }, limit: { max: 90 } };
    const readings = [
      aReading({ quantity: 'percent-passing', value: 92, at: { trial: 'design', sieve: 12.5 } }),
      aReading({ quantity: 'percent-passing', value: 80, at: { trial: 'design', sieve: 9.5 } }),
    ];
    expect(
      findingsOf({ rule, record: { readings } }).map(({ subject, outcome }) => [subject, outcome]),
    ).toEqual([
      ['9.5 mm', 'pass'],
      ['12.5 mm', 'fail'],
    ]);
  });
});
