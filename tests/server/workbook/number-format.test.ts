import { describe, expect, it } from 'vitest';
import { formatDate, formatNumber, isDateFormat } from '#server/workbook/number-format';

describe('showing a stored number through its format', () => {
  // Expected texts: what the format codes mean by ECMA-376 part 1, 18.8.31 (from memory, verify).
  it.each([
    ['2.4118', '0.000', '2.412'],
    ['13.95', '0.0', '14.0'],
    ['0.042', '0.0%', '4.2%'],
    ['0.57', '0%', '57%'],
    ['20000', '#,##0', '20,000'],
    ['5.30', '0.0#', '5.3'],
    ['0.5', '#.0', '.5'],
    ['1234.5', '#,##0.00', '1,234.50'],
    ['-3.2', '0.0;(0.0)', '(3.2)'],
    ['4.2', '0.0" %"', '4.2 %'],
    ['112', '0\\ "psi"', '112 psi'],
    ['0.375', '# ?/?', '3/8'],
    ['1.5', '# ?/?', '1 1/2'],
    ['0.00012', '0.0E+00', '1.2E-04'],
    ['2.3333333333333335', 'General', '2.333333333'],
    ['100', 'General', '100'],
    ['7', '[Red]0.0', '7.0'],
    ['-0.04', '0.0', '0.0'],
  ])('shows %s with %s as %s', (stored, format, shown) => {
    expect(formatNumber(stored, format)).toBe(shown);
  });

  it('tells date formats from number formats', () => {
    expect(isDateFormat('dd/mm/yyyy')).toBe(true);
    expect(isDateFormat('0.00" mm"')).toBe(false);
    expect(isDateFormat('General')).toBe(false);
    expect(isDateFormat('[Red]0.0')).toBe(false);
  });

  it('shows a date in its own order', () => {
    expect(formatDate('2026-03-04', 'dd/mm/yyyy')).toBe('04/03/2026');
    expect(formatDate('2026-03-04', 'd mmm yyyy')).toBe('4 Mar 2026');
    expect(formatDate('2026-03-04T13:05:00', 'yyyy-mm-dd hh:mm')).toBe('2026-03-04 13:05');
  });
});
