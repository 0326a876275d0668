import { describe, expect, it } from 'vitest';
import type { Reading } from '#rules/record';
import { aggregateReadings, analysisOf, computed, reading, reported, trialReadings } from './analysis-record';

const base = [...trialReadings('B'), ...aggregateReadings()];

function valueWith(quantity: string, ...readings: Reading[]) {
  return computed(analysisOf([...base, ...readings]), quantity, { trial: 'B' });
}

describe('tolerance of a reported value', () => {
  it('is half a unit of its last digit and of each input, by its slope', () => {
    // Va = 100·(Gmm − Gmb)/Gmm: half of 0.1, plus 100·0.0005/2.492 for Gmb and 100·Gmb·0.0005/Gmm² for Gmm;
    // Gmb is the mean of two, each to 0.001.
    const hand = 0.05 + (100 * 0.0005) / 2.492 + (100 * 2.392 * 0.0005) / 2.492 ** 2;
    const voids = valueWith('air-voids', reported('air-voids', 4, { trial: 'B' }, '4.0'));
    expect(voids?.tolerance).toBeCloseTo(hand, 6);
    expect(voids?.agrees).toBe(true);
  });

  it('agrees at the tolerance itself and not beyond it', () => {
    // Exact inputs: 100·(2.5 − 2.4)/2.5 = 4; half of 0.1 on the report alone, as the gravities show 12 digits.
    const exact = [
      reading('maximum-specific-gravity', 2.5, { trial: 'B' }, { text: '2.500000000000' }),
      reading('bulk-specific-gravity-mix', 2.4, { trial: 'B' }, { text: '2.400000000000' }),
    ];
    const at = (value: number, text: string) =>
      computed(analysisOf([...exact, reported('air-voids', value, { trial: 'B' }, text)]), 'air-voids', {
        trial: 'B',
      });
    expect(at(4.05, '4.1')?.agrees).toBe(true);
    expect(at(3.95, '3.9')?.agrees).toBe(true);
    expect(at(4.06, '4.1')?.agrees).toBe(false);
  });

  it('takes the digits that the cell shows, not those that it stores', () => {
    const shown = valueWith('air-voids', reported('air-voids', 4.0871, { trial: 'B' }, '4.1'));
    const stored = valueWith('air-voids', reported('air-voids', 4.0871, { trial: 'B' }));
    expect(shown?.agrees).toBe(true);
    expect(stored?.agrees).toBe(false);
  });

  it('reads digits of a cell in another unit in that unit', () => {
    // 145 psi is 999.74 kPa; half a psi is 3.447 kPa.
    const psi = { origin: 'converted' as const, text: '145 psi' };
    const analysis = analysisOf([
      reading('failure-load', 10, { specimen: '1', variant: 'dry' }, { text: '10.0000000' }),
      reading('specimen-thickness', 63, { specimen: '1' }, { text: '63.0000000' }),
      reading('specimen-diameter', 101.1, {}, { text: '101.1000000' }),
      reading('tensile-strength-dry', 999.73980750936, { specimen: '1' }, psi),
    ]);
    const strength = computed(analysis, 'tensile-strength-dry', { trial: 'design', specimen: '1' });
    expect(strength?.tolerance).toBeCloseTo(3.447379, 3);
  });

  it('leaves a value without a report alone', () => {
    expect(valueWith('air-voids')).toMatchObject({
      reported: null,
      tolerance: null,
      agrees: null,
      cause: null,
    });
  });
});

describe('which reported value is compared', () => {
  it('compares specimen by specimen, and their mean with the mean', () => {
    const analysis = analysisOf([
      ...base,
      reported('air-voids', 4.1, { trial: 'B', specimen: '1' }),
      reported('air-voids', 4.9, { trial: 'B', specimen: '2' }),
    ]);
    expect(computed(analysis, 'air-voids', { trial: 'B', specimen: '1' })?.agrees).toBe(true);
    expect(computed(analysis, 'air-voids', { trial: 'B', specimen: '2' })?.agrees).toBe(false);
    const mean = computed(analysis, 'air-voids', { trial: 'B' });
    expect(mean?.reported).toMatchObject({ value: 4.5, source: null });
    expect(mean?.agrees).toBe(false);
  });

  it('compares no value of another trial, test or laboratory', () => {
    const voids = valueWith(
      'air-voids',
      reported('air-voids', 9, { trial: 'A' }),
      reported('air-voids', 7, { trial: 'B', variant: 'dry' }),
      reported('air-voids', 6, { trial: 'B', laboratory: 'agency' }),
      reported('air-voids', 2, { trial: 'B', gyrations: 'maximum' }),
    );
    expect(voids?.reported).toBeNull();
  });

  it('takes none of two reports that disagree', () => {
    const voids = valueWith(
      'air-voids',
      reported('air-voids', 4, { trial: 'B' }),
      reported('air-voids', 4.4, { trial: 'B' }),
    );
    expect(voids?.reported).toBeNull();
  });
});

/** Each wrong value is worked out by hand from the set in `trialReadings` (Pba 0.9663, Pbe 4.3849, Gse 2.70705). */
describe('named causes', () => {
  it.each([
    // 5.0/5.3
    ['dust-proportion', 0.94, 'dust-over-total-binder'],
    // 4.3849/5.0
    ['dust-proportion', 0.88, 'binder-over-dust'],
    // 100 − 2.392·94.7/2.70705
    ['voids-in-mineral-aggregate', 16.3, 'effective-for-bulk-gravity'],
    // 100 − 100·2.392/2.640
    ['voids-in-mineral-aggregate', 9.4, 'aggregate-content-left-out'],
    // 100·(2.492 − 2.392)/2.492, printed as VMA
    ['voids-in-mineral-aggregate', 4, 'air-voids-for-vma'],
    // 5.3·2.392/1.03
    ['effective-binder-volume', 12.3, 'total-for-effective-binder'],
    // 0.9663·94.7/100
    ['absorbed-binder', 0.915, 'absorbed-by-mass-of-mix'],
    // 100·4.0128/14.1961
    ['voids-filled-with-asphalt', 28.3, 'unfilled-for-filled'],
    // 100·2.392/2.492
    ['air-voids', 96, 'relative-density-for-voids'],
  ])('%s reported as %d: %s', (quantity, value, cause) => {
    const text = value === 4 ? '4.0' : value === 96 ? '96.0' : String(value);
    const found = valueWith(quantity, reported(quantity, value, { trial: 'B' }, text));
    expect(found?.agrees).toBe(false);
    expect(found?.cause?.id).toBe(cause);
  });

  it('knows VFA from VMA and air voids that were rounded first', () => {
    // A published chain: VMA 14.427 and Va 3.669 give 74.57, rounded to 14.4 and 3.7 they give 74.31 (MS-2 example).
    const many = (value: number, digits: number) => ({ text: value.toFixed(digits) });
    const analysis = analysisOf([
      reading('binder-content', 5.3, { trial: 'X' }, many(5.3, 6)),
      reading('binder-specific-gravity', 1.03, {}, many(1.03, 6)),
      reading('maximum-specific-gravity', 2.535, { trial: 'X' }, many(2.535, 6)),
      reading('bulk-specific-gravity-mix', 2.442, { trial: 'X' }, many(2.442, 6)),
      reading('bulk-specific-gravity-aggregate', 2.70245, {}, many(2.70245, 6)),
      reported('voids-filled-with-asphalt', 74.3, { trial: 'X' }),
      reported('voids-in-mineral-aggregate', 14.4, { trial: 'X' }),
      reported('air-voids', 3.7, { trial: 'X' }),
    ]);
    const filled = computed(analysis, 'voids-filled-with-asphalt', { trial: 'X' });
    expect(filled?.value).toBeCloseTo(74.57, 2);
    expect(filled?.cause?.id).toBe('rounded-voids');
  });

  it('carries an arithmetic gravity through to VMA', () => {
    const stockpiles = (['coarse', 'fine'] as const).flatMap((stockpile) => [
      reading('stockpile-share', 50, { stockpile }, { text: '50.0' }),
      reading(
        'bulk-specific-gravity-aggregate',
        stockpile === 'coarse' ? 2.4 : 3,
        { stockpile },
        {
          text: stockpile === 'coarse' ? '2.400' : '3.000',
        },
      ),
    ]);
    // Arithmetic 2.700: 100 − 2.392·94.7/2.7 = 16.10; harmonic 2.66667: 15.05.
    const analysis = analysisOf([
      ...trialReadings('B'),
      ...stockpiles,
      reported('voids-in-mineral-aggregate', 16.1, { trial: 'B' }),
    ]);
    const vma = computed(analysis, 'voids-in-mineral-aggregate', { trial: 'B' });
    expect(vma?.value).toBeCloseTo(15.05, 1);
    expect(vma?.cause?.id).toBe('arithmetic-for-harmonic-mean');
  });

  it('knows a strength ratio turned round, and one of pairs', () => {
    const strengths = [
      ...[1000, 800].map((value, place) =>
        reading('tensile-strength-dry', value, { specimen: `D${place}` }, { text: value.toFixed(2) }),
      ),
      ...[700, 800].map((value, place) =>
        reading('tensile-strength-conditioned', value, { specimen: `W${place}` }, { text: value.toFixed(2) }),
      ),
    ];
    const ratioWith = (value: number) =>
      computed(
        analysisOf([...strengths, reported('tensile-strength-ratio', value)]),
        'tensile-strength-ratio',
        {
          trial: 'design',
        },
      );
    // 100·750/900 = 83.33; 100·900/750 = 120; (70 + 100)/2 = 85.
    expect(ratioWith(83.3)?.agrees).toBe(true);
    expect(ratioWith(120)?.cause?.id).toBe('dry-over-conditioned');
    expect(ratioWith(85)?.cause?.id).toBe('mean-of-ratios');
  });

  it('knows recycled content taken by mass of aggregate', () => {
    const readings = [
      reading('binder-content', 6, {}, { text: '6.00' }),
      reading('rap-content', 40, {}, { text: '40.00' }),
      reading('rap-binder-content', 5, {}, { text: '5.000' }),
    ];
    // 40·5/(100·6) = 0.3333; by mass of aggregate 0.3333·0.94 = 0.3133.
    const ratio = computed(
      analysisOf([...readings, reported('recycled-binder-ratio', 0.313)]),
      'recycled-binder-ratio',
      { trial: 'design' },
    );
    expect(ratio?.cause?.id).toBe('recycled-by-mass-of-aggregate');
  });

  it("explains an interpolated value by its own trial's numbers only", () => {
    // Gse is the same 2.70705 at both contents: Gmm = 100/(Ps/Gse + Pb/Gb).
    const trialAt = (trial: string, binder: number) => [
      reading('binder-content', binder, { trial }, { text: binder.toFixed(3) }),
      reading('maximum-specific-gravity', 100 / ((100 - binder) / 2.70705 + binder / 1.03), { trial }),
    ];
    const analysis = analysisOf([
      ...trialAt('A', 5),
      ...trialAt('B', 6),
      ...aggregateReadings(),
      reading('binder-content', 5.5, {}, { text: '5.50' }),
      // 5.0/5.5 over total binder; over effective binder (about 4.59) it is 1.09.
      reported('dust-proportion', 0.91),
    ]);
    const dust = computed(analysis, 'dust-proportion', { trial: 'design' });
    expect(dust).toMatchObject({ origin: 'interpolated', agrees: false });
    expect(dust?.cause?.id).toBe('dust-over-total-binder');
  });

  it('names none where nothing known gives the reported digits', () => {
    const found = valueWith('air-voids', reported('air-voids', 3.1, { trial: 'B' }));
    expect(found).toMatchObject({ agrees: false, cause: null });
  });

  it('names none where two known mistakes give the same digits', () => {
    // Pb − Pba = 4.334 and total binder 5.3 differ, but printed to the nearest 10 both are 0.
    const found = valueWith(
      'effective-binder-content',
      reported('effective-binder-content', 30, { trial: 'B' }, '3e1'),
    );
    expect(found?.cause).toBeNull();
  });
});
