import { Decimal } from 'decimal.js';

const monthNames = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** Formats that files refer to by number only. Source: ECMA-376 part 1, 18.8.30; from memory, verify. */
export const builtInFormats: Record<number, string> = {
  0: 'General',
  1: '0',
  2: '0.00',
  3: '#,##0',
  4: '#,##0.00',
  9: '0%',
  10: '0.00%',
  11: '0.00E+00',
  12: '# ?/?',
  13: '# ??/??',
  14: 'yyyy-mm-dd',
  15: 'd-mmm-yy',
  16: 'd-mmm',
  17: 'mmm-yy',
  18: 'h:mm AM/PM',
  19: 'h:mm:ss AM/PM',
  20: 'h:mm',
  21: 'h:mm:ss',
  22: 'yyyy-mm-dd h:mm',
  37: '#,##0;(#,##0)',
  38: '#,##0;(#,##0)',
  39: '#,##0.00;(#,##0.00)',
  40: '#,##0.00;(#,##0.00)',
  45: 'mm:ss',
  46: '[h]:mm:ss',
  47: 'mm:ss.0',
  48: '##0.0E+0',
  49: '@',
};

export function isDateFormat(format: string): boolean {
  const known = dateFormats.get(format);
  if (known !== undefined) return known;
  const found = showsDate(format);
  // A workbook has few formats and many cells; what one file invents must not stay for ever.
  if (dateFormats.size > 500) dateFormats.clear();
  dateFormats.set(format, found);
  return found;
}

const dateFormats = new Map<string, boolean>([['General', false]]);

function showsDate(format: string): boolean {
  const bare = bareFormat(format.split(';')[0] ?? '');
  return /[dmyhs]/i.test(bare) && !/general/i.test(bare) && !/[0#?]/.test(bare.replace(/s\.0+/gi, ''));
}

/** A stored number as the spreadsheet shows it, as far as its format decides that. */
export function formatNumber(stored: string, format: string): string {
  // The General format shows up to eleven characters as they are stored.
  if (format === 'General' && /^-?\d{1,9}(?:\.\d+)?$/.test(stored) && stored.length <= 11) return stored;
  const value = new Decimal(stored);
  const sections = splitSections(format);
  const usesNegative = value.isNegative() && sections.length > 1;
  const section = sections[usesNegative ? 1 : value.isZero() && sections.length > 2 ? 2 : 0] ?? 'General';
  const magnitude = usesNegative ? value.abs() : value;
  const bare = bareFormat(section);
  if (/general/i.test(bare) || bare.includes('@')) return withLiterals(section, generalText(magnitude));
  if (bare.includes('/')) return fractionText(magnitude, bare);
  if (!/[0#?]/.test(bare)) return withLiterals(section, bare.trim() === '' ? '' : generalText(magnitude));
  if (/e[+-]/i.test(bare)) return exponentText(magnitude, bare);
  return withLiterals(section, decimalText(magnitude, bare));
}

/** A stored serial as the spreadsheet shows the date; ISO where the format is the reader's own short date. */
export function formatDate(iso: string, format: string): string {
  const section = splitSections(format)[0] ?? format;
  const [date = '', time = '00:00:00'] = iso.split('T');
  const [year = '', month = '', day = ''] = date.split('-');
  const [hour = '00', minute = '00', second = '00'] = time.split(':');
  const monthName = monthNames[Number(month) - 1] ?? '';
  const tokens =
    section.replace(/\[[^\]]*\]/g, '').match(/"[^"]*"|\\.|y+|m+|d+|h+|s+(?:\.0+)?|am\/pm|./gi) ?? [];
  let afterHour = false;
  return tokens
    .map((token, index) => {
      const lower = token.toLowerCase();
      if (/^y+$/.test(lower)) return lower.length <= 2 ? year.slice(-2) : year;
      if (/^d+$/.test(lower)) return lower.length === 1 ? String(Number(day)) : day;
      if (/^h+$/.test(lower)) {
        afterHour = true;
        return lower.length === 1 ? String(Number(hour)) : hour;
      }
      if (/^s/.test(lower)) return lower.length === 1 ? String(Number(second)) : second;
      if (lower === 'am/pm') return Number(hour) < 12 ? 'AM' : 'PM';
      if (/^m+$/.test(lower)) {
        const isMinute = afterHour || tokens.slice(index + 1).some((next, at) => /^s/i.test(next) && at < 2);
        if (isMinute) return lower.length === 1 ? String(Number(minute)) : minute;
        if (lower.length >= 4) return monthName;
        if (lower.length === 3) return monthName.slice(0, 3);
        return lower.length === 1 ? String(Number(month)) : month;
      }
      return token.startsWith('"') ? token.slice(1, -1) : token.replace(/^\\/, '');
    })
    .join('');
}

/** What the General format shows: at most eleven characters, trailing noise rounded away. */
function generalText(value: Decimal): string {
  const magnitude = value.abs();
  if (magnitude.isZero()) return '0';
  if (magnitude.gte('1e11') || magnitude.lt('1e-9')) {
    return value.toSignificantDigits(6).toExponential().replace('e', 'E');
  }
  const integerDigits = magnitude.gte(1) ? magnitude.trunc().toFixed().length : 1;
  return value.toDecimalPlaces(Math.max(0, 10 - integerDigits), Decimal.ROUND_HALF_UP).toFixed();
}

function decimalText(value: Decimal, bare: string): string {
  const scaled = bare.includes('%') ? value.times(100) : value;
  const [integerPart = '', decimalPart = ''] = bare.split('.');
  const thousandsScale = /,+$/.exec(integerPart.trimEnd())?.[0].length ?? 0;
  const shown = scaled.div(new Decimal(1000).pow(thousandsScale));
  const most = (decimalPart.match(/[0#?]/g) ?? []).length;
  const least = (decimalPart.match(/0/g) ?? []).length;
  let [integer = '0', decimals = ''] = shown.abs().toFixed(most, Decimal.ROUND_HALF_UP).split('.');
  while (decimals.length > least && decimals.endsWith('0')) decimals = decimals.slice(0, -1);
  const leastInteger = (integerPart.match(/0/g) ?? []).length;
  if (leastInteger === 0 && integer === '0' && decimals !== '') integer = '';
  integer = integer.padStart(leastInteger, '0');
  if (/[0#?],[0#?]/.test(integerPart)) integer = integer.replace(/\B(?=(\d{3})+$)/g, ',');
  const digits = decimals === '' ? integer : `${integer}.${decimals}`;
  const sign = shown.isNegative() && !/^[0.,]*$/.test(digits) ? '-' : '';
  return sign + digits;
}

function exponentText(value: Decimal, bare: string): string {
  const mantissa = /([0#?.]+)e([+-])([0#?]+)/i.exec(bare);
  const decimals = (mantissa?.[1]?.split('.')[1] ?? '').length;
  const [digits = '0', exponent = '+0'] = value.toExponential(decimals, Decimal.ROUND_HALF_UP).split('e');
  const width = mantissa?.[3]?.length ?? 2;
  const sign = exponent.startsWith('-') ? '-' : mantissa?.[2] === '+' ? '+' : '';
  return `${digits}E${sign}${exponent.replace(/^[+-]/, '').padStart(width, '0')}`;
}

function fractionText(value: Decimal, bare: string): string {
  const most = 10 ** Math.min(2, (/\/([?#0]+)/.exec(bare)?.[1] ?? '?').length) - 1;
  const whole = value.abs().trunc();
  const rest = value.abs().minus(whole);
  const sign = value.isNegative() ? '-' : '';
  if (rest.isZero()) return sign + whole.toFixed();
  const [numerator, denominator] = rest.toFraction(most);
  const fraction = `${numerator?.toFixed()}/${denominator?.toFixed()}`;
  return sign + (whole.isZero() ? fraction : `${whole.toFixed()} ${fraction}`);
}

/** Puts a section's quoted words, percent sign and brackets back around the digits. */
function withLiterals(section: string, digits: string): string {
  const parts = section.replace(/\[[^\]]*\]/g, '').match(/"[^"]*"|\\.|_.|\*.|general|[0#?.,@]+|./gi) ?? [];
  let placed = false;
  return parts
    .map((part) => {
      if (/^(?:general|[0#?.,@]+)$/i.test(part)) {
        if (placed) return '';
        placed = true;
        return digits;
      }
      if (part.startsWith('"')) return part.slice(1, -1);
      if (part.startsWith('\\')) return part.slice(1);
      if (part.startsWith('_')) return ' ';
      return part.startsWith('*') ? '' : part;
    })
    .join('')
    .trim();
}

function splitSections(format: string): string[] {
  return format.match(/(?:"[^"]*"|\\.|[^;"\\])+/g) ?? [format];
}

/** The format without quoted words, escapes, colours, conditions and padding. */
function bareFormat(format: string): string {
  return format.replace(/"[^"]*"|\\.|_.|\*.|\[(?!h+\]|m+\]|s+\])[^\]]*\]/gi, '');
}
