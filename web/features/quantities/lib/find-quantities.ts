import type { Quantity } from '#rules/quantities/quantity';
import type { QuantityRow } from '../../../components/ui/quantity-table';
import { workbookNames } from './workbook-names';

/**
 * Quantities in which every word of the search occurs: in name, symbol, id, unit, method or source, or in a name that
 * workbooks give them, which is then told.
 */
export function findQuantities(quantities: readonly Quantity[], search: string): QuantityRow[] {
  const words = plain(search)
    .split(' ')
    .filter((word) => word !== '');
  return quantities.flatMap((quantity): QuantityRow[] => {
    const names = workbookNames(quantity);
    if (holdsAll(ownText(quantity), words)) return [{ quantity, names }];
    const writtenAs = names.find((name) => holdsAll(plain(name), words));
    if (writtenAs !== undefined) return [{ quantity, names, writtenAs }];
    return holdsAll(plain([ownText(quantity), ...names].join(' ')), words) ? [{ quantity, names }] : [];
  });
}

function ownText({ label, symbol, id, unit, acceptedUnits, methods, source }: Quantity): string {
  return plain([label, symbol, id, unit, ...acceptedUnits, ...methods, source].join(' '));
}

function holdsAll(text: string, words: readonly string[]): boolean {
  return words.every((word) => text.includes(word));
}

/** Without case and accents, so that `Körnung` is found by `kornung`. */
function plain(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replace(/\s+/g, ' ').trim();
}
