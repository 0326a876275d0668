import { plainText } from './plain-text';

export type RowRole = 'specimen' | 'average' | 'spread';

const average = /^(?:mean|average|avg\.?|moyenne|mittel(?:wert)?|media|promedio|x-?bar)\b/i;
const spread =
  /^(?:st(?:d|andard)?\.?\s*dev\w*\.?|std\.?|s\.?d\.?|cov|c\.?v\.?|coefficient of variation|range|min(?:imum)?|max(?:imum)?|n|count|total|sum|variance)\b\.?/i;

/** Tells specimens from the rows that a sheet adds under them, by what their key says. */
export function rowRole(keyTexts: string[]): RowRole {
  const texts = keyTexts.map(plainText);
  if (texts.some((text) => average.test(text))) return 'average';
  if (texts.some((text) => spread.test(text) && !/\d/.test(text))) return 'spread';
  return 'specimen';
}

/** What a key names besides saying that its row is an average: `A` in "Mean A"; null where it is no average. */
export function averageOf(text: string): string | null {
  const plain = plainText(text);
  return average.test(plain) ? plain.replace(average, '').replace(/^\s*(?:of|trial|[-:,])*\s*/i, '') : null;
}
