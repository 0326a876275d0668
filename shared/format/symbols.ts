/** A trade symbol in two parts: `Pbe` is P with the subscript be. Whole acronyms (VMA, TSR) have none. */
export interface SymbolParts {
  base: string;
  sub: string;
}

export type TextPart = { kind: 'text'; text: string } | ({ kind: 'symbol' } & SymbolParts);

const acronym = /^[A-Z]{2,}$/;
const withSubscript = /^([A-Za-zτεσµ])_?\{?([a-z]{1,4}|\d+(?:\.\d+)?|[a-z]+\d+|[a-z]+,[a-z]+|∞)?\}?$/u;

export function symbolParts(symbol: string): SymbolParts {
  if (acronym.test(symbol)) return { base: symbol, sub: '' };
  const match = withSubscript.exec(symbol);
  return match ? { base: match[1] ?? symbol, sub: match[2] ?? '' } : { base: symbol, sub: '' };
}

/** Symbols that are never words of a sentence, so that a note may use them as typed. */
const inText = /\b(Gmm|Gmb|Gsb|Gsa|Gse|Gb|Pbe|Pba|Pb|Ps|Vbe|Vba|Va|P0\.075)\b/g;

export function splitSymbols(text: string): TextPart[] {
  const parts: TextPart[] = [];
  let end = 0;
  for (const match of text.matchAll(inText)) {
    if (match.index > end) parts.push({ kind: 'text', text: text.slice(end, match.index) });
    parts.push({ kind: 'symbol', ...symbolParts(match[0]) });
    end = match.index + match[0].length;
  }
  if (end < text.length) parts.push({ kind: 'text', text: text.slice(end) });
  return parts;
}
