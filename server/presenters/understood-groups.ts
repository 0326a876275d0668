import { quantityById } from '#rules/quantities/registry';
import type { Reading } from '#rules/record';
import type { ReadingView } from '#shared/contracts/readings';

type Understood = ReadingView['understood'][number];

/** What was read, grouped by quantity in the order of the workbook, each with its first cell. */
export function understoodGroups(readings: readonly Pick<Reading, 'quantity' | 'source'>[]): Understood[] {
  const groups = new Map<string, Understood>();
  for (const { quantity, source } of readings) {
    if (source === null) continue;
    const group = groups.get(quantity);
    if (group !== undefined) {
      group.count += 1;
      continue;
    }
    const label = quantityById(quantity)?.label ?? quantity;
    groups.set(quantity, { label, count: 1, sheet: source.sheet, cell: source.cell });
  }
  return [...groups.values()];
}
