import { z } from 'zod';
import { limits } from '../limits';
import { dateSchema, idSchema } from './common';
import { endpoint } from './endpoint';
import { organisationKindSchema, roleSchema } from './roles';

export const passwordSchema = z
  .string()
  .min(limits.passwordMinimumCharacters, `Use at least ${limits.passwordMinimumCharacters} characters.`)
  .max(limits.passwordMaximumCharacters, `Use at most ${limits.passwordMaximumCharacters} characters.`);
export const emailSchema = z
  .email('Enter an e-mail address such as name@firm.example.')
  .max(limits.emailCharacters);
export const nameSchema = z.string().trim().min(1, 'Enter a name.').max(limits.nameCharacters);

export const membershipSchema = z.strictObject({
  organisationId: idSchema,
  organisationName: z.string(),
  kind: organisationKindSchema,
  roles: z.array(roleSchema),
});

export const sessionSchema = z.strictObject({
  person: z.strictObject({ id: idSchema, name: z.string(), email: z.string() }),
  /** The active organisation; null until one is chosen. */
  active: membershipSchema.nullable(),
  memberships: z.array(membershipSchema),
  /** Today in the active organisation's zone (a contractor's: UTC date). */
  today: dateSchema,
  timeZone: z.string(),
  /** What the navigation offers. */
  abilities: z.strictObject({
    seeQueue: z.boolean(),
    upload: z.boolean(),
    managePeople: z.boolean(),
    manageProjects: z.boolean(),
    manageOrganisation: z.boolean(),
    confirmSections: z.boolean(),
    writeRules: z.boolean(),
    seeCaughtMail: z.boolean(),
  }),
});

export const getSession = endpoint({
  method: 'get',
  path: '/api/session',
  summary: 'Who is signed in, and for which organisation',
  response: sessionSchema,
});

export const signIn = endpoint({
  method: 'post',
  path: '/api/session',
  summary: 'Sign in with e-mail address and password; sets the session cookie',
  body: z.strictObject({
    email: emailSchema,
    password: z.string().min(1).max(limits.passwordMaximumCharacters),
  }),
  response: sessionSchema,
  open: true,
});

export const signOut = endpoint({ method: 'delete', path: '/api/session', summary: 'Sign out', status: 204 });

export const chooseOrganisation = endpoint({
  method: 'put',
  path: '/api/session/organisation',
  summary: 'Choose the organisation to act for',
  body: z.strictObject({ organisationId: idSchema }),
  response: sessionSchema,
});

export const demoPersonSchema = z.strictObject({
  name: z.string(),
  email: z.string(),
  password: z.string(),
  organisation: z.string(),
  roles: z.array(roleSchema),
});

export const getSignInOptions = endpoint({
  method: 'get',
  path: '/api/sign-in-options',
  summary: 'What the sign-in page shows: the demo people while the demo seed is present',
  response: z.strictObject({ demoPeople: z.array(demoPersonSchema), setUpNeeded: z.boolean() }),
  open: true,
});

export const requestPasswordReset = endpoint({
  method: 'post',
  path: '/api/password-resets',
  summary: 'Ask for a link to set a new password; answers alike whether the address is known or not',
  body: z.strictObject({ email: emailSchema }),
  status: 204,
  open: true,
  idempotent: true,
});

export const resetPassword = endpoint({
  method: 'post',
  path: '/api/password-resets/:token',
  summary: 'Set a new password; ends every other session of the person',
  params: z.strictObject({ token: z.string().min(10).max(200) }),
  body: z.strictObject({ password: passwordSchema }),
  status: 204,
  open: true,
});

export const getSetUp = endpoint({
  method: 'get',
  path: '/api/set-up/:token',
  summary: 'Whether a set-up link still holds',
  params: z.strictObject({ token: z.string().min(10).max(200) }),
  response: z.strictObject({ holds: z.literal(true) }),
  open: true,
});

export const setUp = endpoint({
  method: 'post',
  path: '/api/set-up/:token',
  summary: 'Make the agency and its administrator from the single-use link; signs in',
  params: z.strictObject({ token: z.string().min(10).max(200) }),
  body: z.strictObject({
    agencyName: nameSchema,
    timeZone: z.string().min(1),
    reviewWorkingDays: z.number().int().min(1).max(120),
    name: nameSchema,
    email: emailSchema,
    password: passwordSchema,
  }),
  response: sessionSchema,
  status: 201,
  open: true,
});

export type Session = z.infer<typeof sessionSchema>;
export type DemoPerson = z.infer<typeof demoPersonSchema>;
