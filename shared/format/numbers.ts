/** As wide as a figure, so that signed numbers align. */
export const minusSign = '−';

/** A number with exactly so many decimals, for display only: what is judged was rounded by its rule long before. */
export function formatFixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return '';
  const shortest = Number(value.toPrecision(12));
  const text = Math.abs(shortest).toFixed(decimals);
  return shortest < 0 && Number(text) !== 0 ? `${minusSign}${text}` : text;
}

/** A margin: always signed, `+0.3`, `−0.1`, and `0.0` on the limit. */
export function formatSigned(value: number, decimals: number): string {
  const text = formatFixed(value, decimals);
  if (text === '' || text.startsWith(minusSign)) return text;
  return Number(text) === 0 ? text : `+${text}`;
}

/** Decimals that a written number has: `14.30` has two. */
export function decimalsOf(text: string): number {
  return /\.(\d+)/.exec(text)?.[1]?.length ?? 0;
}

/** A number as it is, in at most so many significant digits, without trailing zeros of the calculation. */
export function formatPlain(value: number, significantDigits = 6): string {
  if (!Number.isFinite(value)) return '';
  const short = Number(value.toPrecision(significantDigits));
  const text = Math.abs(short) < 1e-6 && short !== 0 ? short.toExponential() : String(Math.abs(short));
  return short < 0 && !text.startsWith('-') ? `${minusSign}${text}` : text.replace('-', minusSign);
}

/** Thousands with a comma from 1,000 in sentences; decimals stay as they are. */
export function groupThousands(text: string): string {
  return text.replace(/^([−+-]?)(\d{4,})/, (_, sign: string, whole: string) => {
    return sign + whole.replace(/\B(?=(\d{3})+$)/g, ',');
  });
}

const words = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'];

/** "two rules", "12 rules": words up to nine, figures beyond, as a sentence has it. */
export function countOf(count: number, singular: string, plural = `${singular}s`): string {
  return `${countWord(count)} ${count === 1 ? singular : plural}`;
}

export function countWord(count: number): string {
  return words[count] ?? String(count);
}

/** "2 doubts", "1 doubt": figures throughout, where numbers are compared or stand beside others. */
export function countInFigures(count: number, singular: string, plural = `${singular}s`): string {
  return `${count} ${count === 1 ? singular : plural}`;
}
