import type { CheckView } from '#shared/contracts/checks';

/** "7f3a 91c0 … 5be2": enough of a seal to compare by eye. */
export function sealWords(seal: string): string {
  const digits = seal.replace(/^[a-z0-9-]+:/i, '');
  return `${digits.slice(0, 4)} ${digits.slice(4, 8)} … ${digits.slice(-4)}`;
}

/** "Section 412, edition 2026, with Supplement S-07" */
export function sectionWords({ base, layers }: CheckView['section']): string {
  const added = layers.map((layer) => layer.title).join(' and ');
  return `${base.title}, edition ${base.edition}${added === '' ? '' : `, with ${added}`}`;
}
