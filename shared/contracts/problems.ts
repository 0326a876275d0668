import { z } from 'zod';

/**
 * Every problem that the API can answer with (RFC 9457). `type` is `/problems/<slug>`.
 * `fix` says what the reader should do; a thrown problem may give a more precise one.
 */
export const problemTypes = {
  'invalid-input': {
    status: 422,
    title: 'Some of what was sent cannot be used',
    fix: 'Correct the named fields and send again.',
  },
  'malformed-request': {
    status: 400,
    title: 'The request could not be read',
    fix: 'Send well-formed JSON or a multipart form.',
  },
  'not-signed-in': { status: 401, title: 'You are not signed in', fix: 'Sign in and try again.' },
  'wrong-sign-in': {
    status: 401,
    title: 'E-mail address or password is not right',
    fix: 'Check both, or ask for a new password.',
  },
  'no-organisation': {
    status: 403,
    title: 'No organisation is chosen',
    fix: 'Choose the organisation you act for.',
  },
  'not-allowed': {
    status: 403,
    title: 'Your role does not allow this',
    fix: 'Ask a person with the role, or an administrator of your organisation.',
  },
  'foreign-origin': {
    status: 403,
    title: 'The request came from another site',
    fix: 'Open the product at its own address and repeat the act there.',
  },
  'not-found': { status: 404, title: 'Nothing is here', fix: 'Check the address, or search for it.' },
  'wrong-state': {
    status: 409,
    title: 'This is not possible in its present state',
    fix: 'Look at the present state and choose again.',
  },
  taken: {
    status: 409,
    title: 'Somebody else has taken this',
    fix: 'Ask the person who holds it to give it back.',
  },
  'already-exists': {
    status: 409,
    title: 'This exists already',
    fix: 'Use the one that exists, or choose another name.',
  },
  'key-reused': {
    status: 422,
    title: 'This idempotency key belongs to another request',
    fix: 'Make a new key for each act.',
  },
  'key-missing': {
    status: 400,
    title: 'An idempotency key is missing',
    fix: 'Send an Idempotency-Key header with a new value for each act.',
  },
  'version-missing': {
    status: 428,
    title: 'The version is missing',
    fix: 'Send If-Match with the version that you saw.',
  },
  'version-stale': {
    status: 412,
    title: 'It has changed since you saw it',
    fix: 'Look at the present state, then repeat your change if it still holds.',
  },
  'too-many-requests': {
    status: 429,
    title: 'Too many requests',
    fix: 'Wait for the stated seconds, then try again.',
  },
  'too-large': { status: 413, title: 'The file is too large', fix: 'Send a smaller file.' },
  'file-refused': {
    status: 422,
    title: 'The file cannot be used',
    fix: 'Send a workbook saved as .xlsx, or a .csv or .tsv.',
  },
  'rule-set-refused': { status: 422, title: 'The rule set cannot be used', fix: 'Correct the named places.' },
  'draft-conflict': {
    status: 409,
    title: 'Somebody else changed the same part of the draft',
    fix: 'Look at both versions and keep one of them.',
  },
  'not-immutable': {
    status: 409,
    title: 'A published edition does not change',
    fix: 'Make a new draft from it.',
  },
  'link-used': { status: 410, title: 'This link has been used or has expired', fix: 'Ask for a new one.' },
  'not-ready': { status: 503, title: 'The service is not ready', fix: 'Try again in a few seconds.' },
  internal: {
    status: 500,
    title: 'Something went wrong on our side',
    fix: 'Try again; if it stays, give the request number to your administrator.',
  },
} as const satisfies Record<string, { status: number; title: string; fix: string }>;

export type ProblemSlug = keyof typeof problemTypes;

export const problemErrorSchema = z.strictObject({
  /** JSON pointer into the request body, `/email`. */
  pointer: z.string().optional(),
  sheet: z.string().optional(),
  cell: z.string().optional(),
  detail: z.string(),
  fix: z.string().optional(),
});

export const problemSchema = z.strictObject({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  fix: z.string(),
  instance: z.string().optional(),
  errors: z.array(problemErrorSchema).optional(),
  requestId: z.string(),
  /** With `version-stale` and `draft-conflict`: the present state. */
  present: z.unknown().optional(),
});

export type ProblemError = z.infer<typeof problemErrorSchema>;
export type ProblemBody = z.infer<typeof problemSchema>;
