import { z } from 'zod';
import { dateSchema, idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';
import { organisationKindSchema, roleSchema } from './roles';
import { emailSchema, nameSchema, passwordSchema, sessionSchema } from './session';

export const personSchema = z.strictObject({
  membershipId: idSchema,
  personId: idSchema,
  name: z.string(),
  email: z.string(),
  roles: z.array(roleSchema),
  version: z.number().int(),
  abilities: z.strictObject({ change: z.boolean(), remove: z.boolean() }),
});

export const invitationSchema = z.strictObject({
  id: idSchema,
  email: z.string(),
  name: z.string(),
  roles: z.array(roleSchema),
  /** Where an administrator of an agency invites a contractor's administrator: the contractor's name. */
  organisation: z.string(),
  invitedOn: instantSchema,
  expiresOn: instantSchema,
  mail: z.enum(['waiting', 'sent', 'failed']),
  version: z.number().int(),
});

export const listPeople = endpoint({
  method: 'get',
  path: '/api/people',
  summary: 'People of the active organisation and its open invitations',
  response: z.strictObject({ people: z.array(personSchema), invitations: z.array(invitationSchema) }),
});

export const changePerson = endpoint({
  method: 'patch',
  path: '/api/people/:membershipId',
  summary: 'Change the roles of a person in the active organisation',
  params: z.strictObject({ membershipId: idSchema }),
  body: z.strictObject({ roles: z.array(roleSchema).min(1, 'Choose at least one role.') }),
  response: personSchema,
  versioned: true,
});

export const removePerson = endpoint({
  method: 'delete',
  path: '/api/people/:membershipId',
  summary: 'Take a person out of the active organisation; what they did stays',
  params: z.strictObject({ membershipId: idSchema }),
  status: 204,
  versioned: true,
});

export const invitePerson = endpoint({
  method: 'post',
  path: '/api/invitations',
  summary: "Invite a person by mail; with `contractorId`, a contractor's administrator",
  body: z.strictObject({
    name: nameSchema,
    email: emailSchema,
    roles: z.array(roleSchema).min(1, 'Choose at least one role.'),
    contractorId: idSchema.nullable().default(null),
  }),
  response: invitationSchema,
  status: 201,
  idempotent: true,
});

export const withdrawInvitation = endpoint({
  method: 'delete',
  path: '/api/invitations/:invitationId',
  summary: 'Withdraw an open invitation',
  params: z.strictObject({ invitationId: idSchema }),
  status: 204,
  versioned: true,
});

export const getInvitation = endpoint({
  method: 'get',
  path: '/api/invitation-links/:token',
  summary: 'What an invitation link offers',
  params: z.strictObject({ token: z.string().min(10).max(200) }),
  response: z.strictObject({
    organisation: z.string(),
    kind: organisationKindSchema,
    name: z.string(),
    email: z.string(),
    roles: z.array(roleSchema),
    /** True where the address has a sign-in already: the password is then asked, not made. */
    known: z.boolean(),
  }),
  open: true,
});

export const acceptInvitation = endpoint({
  method: 'post',
  path: '/api/invitation-links/:token',
  summary: 'Accept an invitation, with a new password or the known one; signs in',
  params: z.strictObject({ token: z.string().min(10).max(200) }),
  body: z.strictObject({ name: nameSchema, password: passwordSchema }),
  response: sessionSchema,
  status: 201,
  open: true,
});

export const laboratorySchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  accreditation: z.string().nullable(),
  mappings: z.number().int(),
  since: dateSchema,
  version: z.number().int(),
});

export const listLaboratories = endpoint({
  method: 'get',
  path: '/api/laboratories',
  summary: 'Laboratories of the active organisation',
  response: z.strictObject({
    laboratories: z.array(laboratorySchema),
    abilities: z.strictObject({ add: z.boolean() }),
  }),
});

export const addLaboratory = endpoint({
  method: 'post',
  path: '/api/laboratories',
  summary: 'Add a laboratory to the active organisation',
  body: z.strictObject({
    name: nameSchema,
    accreditation: z.string().trim().max(120).nullable().default(null),
  }),
  response: laboratorySchema,
  status: 201,
  idempotent: true,
});

export type Person = z.infer<typeof personSchema>;
export type Invitation = z.infer<typeof invitationSchema>;
export type Laboratory = z.infer<typeof laboratorySchema>;
