import { z } from 'zod';
import { limits } from '../limits';
import { idSchema } from './common';
import { endpoint } from './endpoint';
import { organisationKindSchema, waiverPolicySchema } from './roles';
import { nameSchema } from './session';

export const letterheadSchema = z.strictObject({
  /** "Materials and Pavements" */
  department: z.string().trim().max(limits.nameCharacters),
  address: z.string().trim().max(limits.addressCharacters),
  telephone: z.string().trim().max(60),
  email: z.string().trim().max(limits.emailCharacters),
  /** Stands under every letter, above the cautions. */
  closing: z.string().trim().max(limits.addressCharacters),
});

export const organisationSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  kind: organisationKindSchema,
  timeZone: z.string(),
  reviewWorkingDays: z.number().int(),
  waiverPolicy: waiverPolicySchema,
  letterhead: letterheadSchema,
  version: z.number().int(),
  abilities: z.strictObject({ change: z.boolean() }),
});

export const getOrganisation = endpoint({
  method: 'get',
  path: '/api/organisation',
  summary: 'The active organisation and its settings',
  response: organisationSchema,
});

export const changeOrganisation = endpoint({
  method: 'patch',
  path: '/api/organisation',
  summary: 'Change name, zone, clock, waiver policy or letterhead',
  body: z.strictObject({
    name: nameSchema,
    timeZone: z.string().min(1),
    reviewWorkingDays: z
      .number()
      .int()
      .min(1, 'At least 1 working day.')
      .max(120, 'At most 120 working days.'),
    waiverPolicy: waiverPolicySchema,
    letterhead: letterheadSchema,
  }),
  response: organisationSchema,
  versioned: true,
});

export const contractorSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  projects: z.number().int(),
  /** True once somebody belongs to it. */
  joined: z.boolean(),
  invited: z.boolean(),
});

export const listContractors = endpoint({
  method: 'get',
  path: '/api/contractors',
  summary: 'Contractors that work with the active agency',
  response: z.strictObject({
    contractors: z.array(contractorSchema),
    abilities: z.strictObject({ add: z.boolean() }),
  }),
});

export const addContractor = endpoint({
  method: 'post',
  path: '/api/contractors',
  summary: 'Add a contractor and invite its administrator by mail',
  body: z.strictObject({
    name: nameSchema,
    administrator: z.strictObject({ name: nameSchema, email: z.email('Enter an e-mail address.') }),
  }),
  response: contractorSchema,
  status: 201,
  idempotent: true,
});

export type Letterhead = z.infer<typeof letterheadSchema>;
export type Organisation = z.infer<typeof organisationSchema>;
