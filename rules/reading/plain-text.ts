/** Text as people mean it: one kind of space, of minus and of digit, whatever the keyboard. */
export function plainText(text: string): string {
  if (plainAlready.test(text)) return text;
  return text
    .normalize('NFKC')
    .replace(/[\s\u00a0\u2007\u202f\u200b\ufeff]+/g, ' ')
    .replace(/[\u2212\u2010\u2011\u2012\u2013\u2014]/g, '-')
    .trim();
}

/** Most cells need no work: printable ASCII without a space at either end or two together. */
const plainAlready = /^[!-~]+(?: [!-~]+)*$/;

/** For comparing labels: without case, trailing colon, and repeated space. */
export function labelKey(text: string): string {
  return plainText(text)
    .toLowerCase()
    .replace(/\s*:$/, '')
    .replace(/\s*([,()[\]/])\s*/g, '$1');
}

const notAValue = new Set([
  'n/a',
  'na',
  'n.a.',
  'n.a',
  '#n/a',
  'nd',
  'n/d',
  'n.d.',
  'n/t',
  'nt',
  'not tested',
  'not applicable',
  'not determined',
  'not available',
  'not required',
  'tbd',
  'pending',
  'to follow',
  'none',
  'nil',
  '-',
  '--',
  '---',
]);

/** `N/A`, `ND`, a dash: the cell says that there is no value. */
export function saysNoValue(text: string): boolean {
  return notAValue.has(plainText(text).toLowerCase());
}
