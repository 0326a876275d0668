import { z } from 'zod';
import { conditionsSchema } from '../record';

const methodPrecisionSchema = z.strictObject({
  /** In the quantity's canonical unit. */
  singleOperatorStandardDeviation: z.number().positive(),
  source: z.string(),
  /** `memory` is shown with "from memory, verify". */
  origin: z.enum(['read', 'derived', 'memory', 'agency']),
});

/**
 * One entry of the registry. A rule set may declare further quantities in the same shape, so everything
 * that an author need not think about has a default.
 */
export const quantitySchema = z.strictObject({
  /** Kebab-case trade name. */
  id: z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'A quantity id is lower-case words joined by hyphens.'),
  /** Trade symbol in plain text, `Gmm`. */
  symbol: z.string().min(1),
  /** Lower-case noun phrase that can open a sentence when capitalised. */
  label: z.string().min(1),
  /** True where the label takes "are". */
  plural: z.boolean().default(false),
  /** Canonical unit; `1` for a number without one. */
  unit: z.string().min(1),
  /** Units a workbook may state it in, the canonical one included. */
  acceptedUnits: z.array(z.string()).default([]),
  /** Decimals usually reported, in the canonical unit. */
  decimals: z.number().int().nonnegative().default(1),
  /** Outside it a value is doubted when read. It is never a limit. */
  plausible: z
    .strictObject({ min: z.number(), max: z.number() })
    .default({ min: -1e12, max: 1e12 })
    .refine(({ min, max }) => min < max, 'The plausible range needs a min below its max.'),
  /** How far a gauge reaches beyond its limit, in the canonical unit; in decades on a logarithmic scale. */
  gaugeSpan: z.number().positive().default(1),
  gaugeScale: z.enum(['linear', 'log']).default('linear'),
  /** Conditions without which a reading of it means nothing. */
  conditions: z.array(conditionsSchema.keyof()).default([]),
  methods: z.array(z.string()).default([]),
  methodPrecision: methodPrecisionSchema.nullable().default(null),
  /** How workbooks name it, besides symbol and label. */
  aliases: z.array(z.string()).default([]),
  kind: z.enum(['measured', 'derived']).default('measured'),
  /** Of a derived quantity: its formula in trade symbols. */
  derivation: z.string().nullable().default(null),
  /** Whose property it is. Without a trial, a property of aggregate or binder belongs to every trial. */
  subject: z.enum(['mix', 'aggregate', 'binder', 'specimen']).default('mix'),
  source: z.string().default('common practice, no source'),
});

export type Quantity = z.infer<typeof quantitySchema>;
/** As written in the registry and in rule sets: what has a default may be left out. */
export type QuantityInput = z.input<typeof quantitySchema>;
