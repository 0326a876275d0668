import type { z } from 'zod';
import { quantityById } from '#rules/quantities/registry';
import { type Reading, readingSchema } from '#rules/record';

type ReadingInput = z.input<typeof readingSchema>;

/** A measured reading at the design, in the quantity's own unit; override what matters. */
export function aReading(
  overrides: Partial<ReadingInput> & Pick<ReadingInput, 'quantity' | 'value'>,
): Reading {
  return readingSchema.parse({
    unit: quantityById(overrides.quantity)?.unit ?? '1',
    origin: quantityById(overrides.quantity)?.kind === 'derived' ? 'reported' : 'measured',
    at: { trial: 'design' },
    source: { sheet: 'Trials', cell: 'E9', text: String(overrides.value) },
    ...overrides,
  });
}

/** One reading a specimen, labelled 1, 2, 3 …, each from a cell of its own. */
export function replicates(
  quantity: string,
  values: number[],
  overrides: Partial<ReadingInput> = {},
): Reading[] {
  return values.map((value, i) =>
    aReading({
      quantity,
      value,
      source: { sheet: 'Trials', cell: `E${9 + i}`, text: String(value) },
      ...overrides,
      at: { trial: 'design', ...overrides.at, specimen: String(i + 1) },
    }),
  );
}
