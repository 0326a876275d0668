import type { Quantity } from '#rules/quantities/quantity';
import type { QuantityRow } from '../../../components/ui/quantity-table';

const groups: { subject: Quantity['subject']; title: string; about: string }[] = [
  { subject: 'mix', title: 'Mix', about: 'of a trial or of the design' },
  { subject: 'specimen', title: 'Specimen', about: 'of one specimen or core' },
  { subject: 'aggregate', title: 'Aggregate', about: 'of a stockpile or of the blend, for every trial' },
  { subject: 'binder', title: 'Binder', about: 'of the binder, for every trial' },
];

export interface QuantityGroup {
  title: string;
  about: string;
  rows: QuantityRow[];
}

/** By what they are a property of; groups without a row are left out. */
export function groupQuantities(rows: readonly QuantityRow[]): QuantityGroup[] {
  return groups
    .map(({ subject, title, about }) => ({
      title,
      about,
      rows: rows.filter(({ quantity }) => quantity.subject === subject),
    }))
    .filter((group) => group.rows.length > 0);
}
