import { z } from 'zod';

const scalarSchema = z.union([z.number(), z.string(), z.boolean()]);

const typeSchema = z.enum(['number', 'text', 'boolean', 'date']);

/** A property of the mix that rules branch on. */
export const attributeSchema = z.strictObject({
  name: z.string().min(1),
  label: z.string().optional(),
  type: typeSchema,
  unit: z.string().optional(),
  /** Other labels under which workbooks state it. */
  aliases: z.array(z.string()).optional(),
  /** Closed list of values; a value that matches none is a doubt. */
  values: z
    .array(
      z.union([
        scalarSchema,
        z.strictObject({
          value: scalarSchema,
          label: z.string().optional(),
          aliases: z.array(z.string()).optional(),
        }),
      ]),
    )
    .optional(),
});

/** As an edition declares it: a type left out is the standard attribute's, else that of the values, else text. */
export const declaredAttributeSchema = attributeSchema
  .extend({ type: typeSchema.optional() })
  .transform((declared) => ({
    ...standardOf(declared.name),
    ...declared,
    type: declared.type ?? standardOf(declared.name)?.type ?? typeOfValues(declared.values),
  }));

export type AttributeDefinition = z.infer<typeof attributeSchema>;
export type Scalar = z.infer<typeof scalarSchema>;

function standardOf(name: string): AttributeDefinition | undefined {
  return STANDARD_ATTRIBUTES.find((standard) => standard.name === name);
}

function typeOfValues(values: AttributeDefinition['values']): AttributeDefinition['type'] {
  const kinds = new Set(
    (values ?? []).map((entry) => typeof (typeof entry === 'object' ? entry.value : entry)),
  );
  const [only] = kinds;
  return kinds.size === 1 && (only === 'number' || only === 'boolean') ? only : 'text';
}

/** The attributes that every edition knows without declaring them. */
export const STANDARD_ATTRIBUTES: AttributeDefinition[] = [
  { name: 'mixType', label: 'Mix type', type: 'text', aliases: ['type of mix', 'mixture type'] },
  {
    name: 'nominalMaximumSize',
    label: 'Nominal maximum aggregate size',
    type: 'number',
    unit: 'mm',
    aliases: ['NMAS', 'nominal maximum size', 'nominal size'],
  },
  {
    name: 'designTraffic',
    label: 'Design traffic',
    type: 'number',
    unit: 'million ESAL',
    aliases: ['design ESALs', 'ESAL', 'traffic'],
  },
  {
    name: 'course',
    label: 'Course',
    type: 'text',
    aliases: ['layer', 'pavement course'],
    values: [
      { value: 'surface', aliases: ['wearing'] },
      { value: 'intermediate', aliases: ['leveling', 'levelling'] },
      'binder',
      'base',
    ],
  },
  {
    name: 'binderGrade',
    label: 'Binder grade',
    type: 'text',
    aliases: ['PG grade', 'asphalt grade', 'grade'],
  },
  {
    name: 'compactionMethod',
    label: 'Compaction method',
    type: 'text',
    aliases: ['method of compaction', 'compactor'],
  },
  {
    name: 'compactionBlows',
    label: 'Compaction blows',
    type: 'number',
    unit: 'blows per face',
    aliases: ['blows', 'blows per side'],
  },
];

/** Standard attributes with the edition's own in place of or beside them. */
export function withStandardAttributes(declared: AttributeDefinition[]): AttributeDefinition[] {
  const own = new Set(declared.map((attribute) => attribute.name));
  return [...declared, ...STANDARD_ATTRIBUTES.filter((attribute) => !own.has(attribute.name))];
}

export function attributeLabel(attribute: AttributeDefinition): string {
  return attribute.label ?? attribute.name;
}
