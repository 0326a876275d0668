import { plainText } from './plain-text';

export interface ParsedNumber {
  /** Decimal digits with a point, ready for decimal arithmetic. */
  digits: string;
  qualifier?: '<' | '>';
  /** What follows the number, often a unit. */
  rest: string;
}

export type ParseOutcome =
  | { state: 'number'; number: ParsedNumber }
  /** Several numbers are meant by one text; which one is for a person to say. */
  | { state: 'ambiguous'; reason: 'comma' | 'point' | 'range'; numbers: ParsedNumber[] }
  | { state: 'text' };

/**
 * Takes a text for a number where it says one: `4.2 %`, `<0.1`, `20,000+`, full-width digits, no-break spaces.
 * The decimal separator is the mapping's; the other one is doubted unless it can only group thousands.
 */
export function parseNumberText(text: string, decimal: '.' | ','): ParseOutcome {
  const plain = plainText(text);
  const range = /^([+-]?[\d.,]+)\s*(?:-|to)\s*([\d.,]+)\s*([^\d]*)$/.exec(plain);
  if (range) {
    const ends = [range[1], range[2]].map((end) => separated(end as string, decimal)[0]);
    if (ends.some((end) => end === undefined)) return { state: 'text' };
    const rest = (range[3] as string).trim();
    return {
      state: 'ambiguous',
      reason: 'range',
      numbers: ends.map((digits) => ({ digits: digits as string, rest })),
    };
  }
  const match =
    /^([<>]|less than|more than|greater than)?\s*([+-]?(?:\d[\d.,' ]*|[.,]\d+)(?:e[+-]?\d+)?)(.*)$/i.exec(
      plain,
    );
  if (!match) return { state: 'text' };
  const body = (match[2] as string).trim().replace(/[.,]$/, '');
  let rest = (match[3] as string).trim();
  let qualifier = qualifierOf(match[1]);
  if (rest === '+' && !qualifier) {
    qualifier = '>';
    rest = '';
  }
  const readings = separated(body, decimal);
  const numbers = readings.map((digits) => ({ digits, rest, ...(qualifier ? { qualifier } : {}) }));
  const [first] = numbers;
  if (!first) return { state: 'text' };
  if (numbers.length === 1 && !isForeign(body, decimal)) return { state: 'number', number: first };
  return { state: 'ambiguous', reason: decimal === '.' ? 'comma' : 'point', numbers };
}

function qualifierOf(word: string | undefined): '<' | '>' | undefined {
  if (word === undefined) return undefined;
  return word === '<' || /^less/i.test(word) ? '<' : '>';
}

/** True where the only separator is the one that the mapping does not use for decimals. */
function isForeign(body: string, decimal: '.' | ','): boolean {
  const other = decimal === '.' ? ',' : '.';
  const bare = body.replace(/[' ]/g, '');
  return bare.includes(other) && !bare.includes(decimal);
}

/** The plain decimal forms that a digit string can mean, the likeliest first; none where it is no number. */
function separated(body: string, decimal: '.' | ','): string[] {
  const [mantissa = '', exponent] = body.split(/e/i);
  const power = exponent === undefined ? '' : `e${exponent}`;
  const sign = /^[+-]/.exec(mantissa)?.[0] === '-' ? '-' : '';
  const bare = mantissa.replace(/^[+-]/, '');
  const grouped = /^\d{1,3}(?:[ ']\d{3})+(?=$|[.,])/.test(bare) ? bare.replace(/[ ']/g, '') : bare;
  if (/[ ']/.test(grouped)) return [];
  const other = decimal === '.' ? ',' : '.';
  const forms: string[] = [];
  const asDecimal = (text: string, mark: string) => {
    const [integer = '', fraction = '', ...more] = text.split(mark);
    if (more.length > 0 || !/^\d*$/.test(integer) || !/^\d*$/.test(fraction) || integer + fraction === '')
      return;
    forms.push(`${sign}${integer === '' ? '0' : integer}${fraction === '' ? '' : `.${fraction}`}${power}`);
  };
  if (!grouped.includes(other)) asDecimal(grouped, decimal);
  else {
    const thousands = new RegExp(`^\\d{1,3}(?:\\${other}\\d{3})+(?:\\${decimal}\\d*)?$`);
    if (!grouped.includes(decimal)) asDecimal(grouped, other);
    if (thousands.test(grouped)) asDecimal(grouped.replaceAll(other, ''), decimal);
  }
  return forms;
}
