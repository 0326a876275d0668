import type { MappingView } from '#shared/contracts/mappings';

/** A mapping with two versions that its reader may change. */
export function aMappingView(overrides: Partial<MappingView> = {}): MappingView {
  return {
    id: '0192f0a0-0000-7000-8000-0000000000a1',
    name: 'Brightwater Central, 2025 layout',
    laboratory: { id: '0192f0a0-0000-7000-8000-0000000000b1', name: 'Brightwater Central Laboratory' },
    number: 2,
    rules: 2,
    usedBy: 3,
    changedBy: 'Dele Fairweather',
    changedAt: '2026-03-09T10:00:00.000Z',
    retiredAt: null,
    version: 7,
    abilities: { change: true },
    sentences: ['Cells under “Bulk SG” are Gmb.', 'Cells under “Remarks” are not readings.'],
    versions: [
      {
        number: 2,
        rules: 2,
        origin: 'Learned from BW-125-S4 r1.xlsx',
        by: 'Dele Fairweather',
        at: '2026-03-09T10:00:00.000Z',
      },
      { number: 1, rules: 1, origin: 'Imported', by: 'Sorcha Lund', at: '2026-02-02T10:00:00.000Z' },
    ],
    ...overrides,
  };
}
