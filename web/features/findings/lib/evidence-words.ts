import type { Evidence } from '#rules/engine/finding';
import { formatPlain } from '#shared/format/numbers';
import { formatSieve } from '#shared/format/units';

/** A quantity's id as people say it: the registry's ids are the trade's words with hyphens. */
export function evidenceName(evidence: Pick<Evidence, 'quantity'>): string {
  return wordsOfName(evidence.quantity);
}

/** `designTraffic` and `air-voids` as words; the registry's and an edition's names are the trade's own. */
export function wordsOfName(name: string): string {
  return name
    .replace(/-/g, ' ')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase();
}

/** Where and under which conditions a value was taken: "trial B, specimen 2", "12.5 mm". */
export function placeWords({ at }: Pick<Evidence, 'at'>): string {
  if (!at) return '';
  const words = [
    at.trial === 'design' ? 'design' : at.trial !== undefined && `trial ${at.trial}`,
    at.blend !== undefined && `blend ${at.blend}`,
    at.stockpile !== undefined && `stockpile ${at.stockpile}`,
    at.specimen !== undefined && `specimen ${at.specimen}`,
    at.sieve !== undefined && formatSieve(at.sieve),
    at.gyrations !== undefined && `${at.gyrations} gyrations`,
    at.temperature !== undefined && `${formatPlain(at.temperature)} °C`,
    at.time !== undefined && `${formatPlain(at.time)} s`,
    at.passes !== undefined && `${formatPlain(at.passes)} passes`,
    at.variant !== undefined && at.variant,
    at.aging !== undefined && at.aging,
    at.laboratory === 'agency' && 'agency’s laboratory',
  ];
  return words.filter((word) => word !== false && word !== '').join(', ');
}
