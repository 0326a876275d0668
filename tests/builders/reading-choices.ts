import type { z } from 'zod';
import type { getReadingChoices } from '#shared/contracts/corrections';

type Choices = z.input<NonNullable<typeof getReadingChoices.response>>;

/** Two quantities, one attribute and one kind of document that cells can be said to be. */
export function readingChoices(): Choices {
  return {
    quantities: [
      {
        id: 'bulk-specific-gravity-of-mix',
        label: 'bulk specific gravity of the mix',
        symbol: 'Gmb',
        unit: '1',
        units: ['1'],
        aliases: ['Bulk SG'],
        judged: false,
      },
      {
        id: 'air-voids',
        label: 'air voids',
        symbol: 'Va',
        unit: '%',
        units: ['%'],
        aliases: ['voids total mix'],
        judged: true,
      },
    ],
    attributes: [{ name: 'course', label: 'course', unit: null, values: ['surface', 'binder', 'base'] }],
    documents: [{ type: 'binder-certificate', label: 'Binder certificate' }],
  };
}
