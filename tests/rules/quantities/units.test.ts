import { describe, expect, it } from 'vitest';
import { convert, normaliseUnit } from '#rules/quantities/units';
import fc from '#tests/builders/seeded-fast-check';

describe('names of units', () => {
  it.each([
    ['µm', 'µm'],
    ['μm', 'µm'],
    ['microns', 'µm'],
    ['kg/m^3', 'kg/m³'],
    ['kg/m3', 'kg/m³'],
    ['PCF', 'lb/ft³'],
    ['PSI', 'psi'],
    ['(psi)', 'psi'],
    ['º F', '°F'],
    ['deg C', '°C'],
    ['℃', '°C'],
    ['percent', '%'],
    ['GPa⁻¹', '1/GPa'],
    ['in.', 'in'],
    ['"', 'in'],
    ['10^6 ESALs', 'million'],
    ['microstrain', 'µε'],
    ['µε', 'µε'],
    ['Pa·s', 'Pa·s'],
    ['', null],
    ['furlong', null],
    ['m3', null],
  ])('%s is %s', (text, unit) => {
    expect(normaliseUnit(text)).toBe(unit);
  });

  it('keeps case where it tells two units apart', () => {
    expect(normaliseUnit('mPa·s')).toBe('mPa·s');
    expect(normaliseUnit('MPa')).toBe('MPa');
    expect(normaliseUnit('Mg/m3')).toBe('Mg/m³');
  });
});

describe('conversion', () => {
  it('moves temperatures as points of their scale', () => {
    expect(convert(77, '°F', '°C')).toEqual({ ok: true, value: 25 });
    expect(convert(32, '°F', '°C')).toEqual({ ok: true, value: 0 });
    expect(convert(-40, '°F', '°C')).toEqual({ ok: true, value: -40 });
  });

  it('knows the trade units that the library lacks', () => {
    // 10 P = 1 Pa·s by definition; 1 kgf = 9.80665 N (standard gravity).
    expect(convert(10, 'poise', 'Pa·s')).toEqual({ ok: true, value: 1 });
    expect(convert(1, 'kgf', 'N')).toEqual({ ok: true, value: 9.80665 });
    expect(convert(12, '0.25 mm', 'mm')).toEqual({ ok: true, value: 3 });
    expect(convert(3_000_000, 'ESALs', 'million')).toEqual({ ok: true, value: 3 });
    expect(convert(0.01, 'mm/mm', 'µε')).toEqual({ ok: true, value: 10000 });
  });

  it.each([
    [5, '%', '1'],
    [5, 'passes', 'cycles'],
    [5, 'kPa', 'mm'],
    [5, 'furlong', 'mm'],
    [5, 'mm', 'furlong'],
    [Number.NaN, 'mm', 'in'],
    [Number.POSITIVE_INFINITY, 'mm', 'mm'],
  ])('refuses %d %s in %s and says why', (value, from, to) => {
    expect(convert(value, from, to)).toEqual({ ok: false, reason: expect.stringMatching(/\w/) });
  });

  it('comes back to where it started', () => {
    const pairs = [
      ['psi', 'kPa'],
      ['lb/ft³', 'kg/m³'],
      ['1/psi', '1/GPa'],
      ['in', 'mm'],
      ['°F', '°C'],
    ] as const;
    fc.assert(
      fc.property(
        fc.double({ min: -1000, max: 1000, noNaN: true }),
        fc.constantFrom(...pairs),
        (value, [from, to]) => {
          const there = convert(value, from, to);
          const back = there.ok ? convert(there.value, to, from) : there;
          expect(back.ok && back.value).toBeCloseTo(value, 6);
        },
      ),
    );
  });
});
