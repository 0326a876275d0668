import type { z } from 'zod';
import { type Finding, findingSchema } from '#rules/engine/finding';

type FindingInput = z.input<typeof findingSchema>;

/** A fail on voids in the mineral aggregate, with every field filled; override what matters. */
export function aFinding(overrides: Partial<FindingInput> = {}): Finding {
  return findingSchema.parse({
    rule: 'vma',
    clause: '412.03(b)',
    title: 'Voids in the mineral aggregate',
    subject: 'design point',
    severity: 'required',
    outcome: 'fail',
    borderline: false,
    kind: 'reading',
    observed: { value: 13.94, rounded: 13.9, text: '13.9', unit: '%', statistic: 'mean', count: 2 },
    limit: { min: 14, max: null, decimals: 1, unit: '%' },
    margin: -0.1,
    ruleSentence: 'Voids in the mineral aggregate are at least the value of Table 412-2.',
    requirement: 'Voids in the mineral aggregate are at least 14.0 %.',
    sentence: 'Voids in the mineral aggregate are 13.9 %, at least 14.0.',
    reason: '13.9 is below 14.0 by 0.1.',
    roundingSentence: '13.94 becomes 13.9: ASTM E29, rounding method, to 0.1',
    precision: null,
    advice: null,
    source: null,
    gauge: { span: 1.5, scale: 'linear' },
    evidence: [
      {
        quantity: 'voids-in-mineral-aggregate',
        value: 13.94,
        unit: '%',
        origin: 'recomputed',
        formula: '100 − Gmb·Ps/Gsb',
        source: { sheet: 'Trials', cell: 'G9', text: '13.9' },
      },
    ],
    ...overrides,
  } satisfies FindingInput);
}
