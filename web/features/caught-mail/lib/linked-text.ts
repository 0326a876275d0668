export interface TextPiece {
  /** Place of the piece in the text. */
  at: number;
  text: string;
  href: string | null;
}

const address = /https?:\/\/[^\s<>"]+/g;

/** Plain text with its addresses set apart, so that they can be followed; a full stop after one is not part of it. */
export function linkedText(text: string): TextPiece[] {
  const pieces: TextPiece[] = [];
  let end = 0;
  for (const match of text.matchAll(address)) {
    const href = match[0].replace(/[.,;:)\]]+$/, '');
    if (match.index > end) pieces.push({ at: end, text: text.slice(end, match.index), href: null });
    pieces.push({ at: match.index, text: href, href });
    end = match.index + href.length;
  }
  if (end < text.length) pieces.push({ at: end, text: text.slice(end), href: null });
  return pieces;
}
