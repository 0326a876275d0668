import { plainText } from '../plain-text';

const fillers = new Set(
  'of the de der des du di le les el los las del im den dem von vom zur zum et und y and por pour par para fur mit avec con at @ on au aux en is as per'.split(
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
  const tokens: string[] = [];
  for (const word of foldedWords(text)) {
    if (percentWords.has(word)) tokens.push('%');
    else if (!fillers.has(word)) tokens.push(word);
  }
  return tokens;
}

function foldedWords(text: string): string[] {
  return (
    plainText(text)
      .toLowerCase()
      .normalize('NFD')
      .replace(/[\u0300-\u036f_|]/g, '')
      .replace(/ß/g, 'ss')
      .replace(/[μµ]/g, 'μ')
      .match(/\d+(?:[.,]\d+)?|%|#|[\p{L}*][\p{L}\d*]*/gu) ?? []
  );
}
