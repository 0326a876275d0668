import { plainText } from '../plain-text';
import { sameWords } from './same-words';

const fillers = new Set(
  'of the de der des du di le les el los las del im den dem von vom zur zum et und y and por pour par para fur mit avec con at @ on au aux en is as per in to am dans sur'.split(
    ' ',
  ),
);

const percentWords = new Set([
  'percent',
  'pct',
  'prozent',
  'pourcentage',
  'porcentaje',
  'm-%',
  'vol-%',
  'perc',
]);

/** The words of a label in one writing: without case, accents, filler words and marks; every word for percent is `%`. */
export function tokensOf(text: string): string[] {
  return markedTokensOf(text).map(withoutMark);
}

/** The same, with the point kept behind a word that is cut short: `stab.`, `hohlraumgeh.` */
export function markedTokensOf(text: string): string[] {
  const tokens: string[] = [];
  for (const word of foldedWords(text)) {
    const bare = withoutMark(word);
    if (percentWords.has(bare)) tokens.push('%');
    else if (!fillers.has(bare)) {
      const same = sameWords.get(bare);
      tokens.push(same ?? (bare === word ? singular(bare) : word));
    }
  }
  return tokens;
}

export function withoutMark(token: string): string {
  return token.length > 1 && token.endsWith('.') ? token.slice(0, -1) : token;
}

/** "Fractured faces" and "fractured face" are one name; "analysis" and "mass" are no plurals. */
function singular(word: string): string {
  return word.length > 4 && /[^siu]s$/.test(word) ? word.slice(0, -1) : word;
}

/** "S.G.", "V.F.A." and "% A.C." are written for SG, VFA and AC; `M.-%` is not. */
const pointedLetters = /(?<![\p{L}\d])(?:\p{L}\.\s?){1,4}\p{L}(?:\.|(?![\p{L}\d.'’-]))/gu;

/** Every way of writing "specific gravity", and the words that French and Spanish run together. */
const writings: [RegExp, string][] = [
  [
    /(?<![\p{L}\d])(?:specific|spec\.?|sp\.?)\s*(?:gravit(?:y|ies)|grav\.?|gr\.?)(?![\p{L}\d])|\bspg\b/giu,
    'sg',
  ],
  [/(?<![\p{L}\d])(?:gravedad|grav\.?)\s*(?:espec[ií]fica|espec\.?|esp\.?)(?![\p{L}\d])/giu, 'sg'],
  [/(?<![\p{L}\d])[dl]['’](?=\p{L})/giu, ''],
  [/(?<![\p{L}\d])t°(?!\s*[cf](?![\p{L}\d]))/giu, 'temperature '],
];

function foldedWords(text: string): string[] {
  let plain = plainText(text).replace(pointedLetters, (letters) => ` ${letters.replace(/[.\s]/g, '')} `);
  for (const [pattern, word] of writings) plain = plain.replace(pattern, word);
  return foldedText(plain).match(/\d+(?:[.,]\d+)?|%|#|[\p{L}*][\p{L}\d*]*\.?/gu) ?? [];
}

/** Without case, accents and the other marks that keyboards lack. */
export function foldedText(text: string): string {
  return text
    .toLowerCase()
    .normalize('NFD')
    .replace(/[\u0300-\u036f_|]/g, '')
    .replace(/ß/g, 'ss')
    .replace(/[μµ]/g, 'μ');
}
