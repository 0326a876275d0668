import { z } from 'zod';
import { idSchema, instantSchema } from './common';
import { endpoint } from './endpoint';

export const caughtMailListItemSchema = z.strictObject({
  id: idSchema,
  caughtAt: instantSchema,
  from: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  attachments: z.number().int(),
});

export const caughtMailSchema = caughtMailListItemSchema.extend({
  messageId: z.string(),
  inReplyTo: z.string().nullable(),
  text: z.string(),
  html: z.string().nullable(),
  files: z.array(
    z.strictObject({ name: z.string(), mediaType: z.string(), bytes: z.number().int(), href: z.string() }),
  ),
});

/** Open, because invited people have no sign-in yet; registered only while mail is caught on loopback. */
export const listCaughtMail = endpoint({
  method: 'get',
  path: '/api/caught-mail',
  summary: 'Mail caught on loopback; development and demo only',
  open: true,
  response: z.strictObject({ mails: z.array(caughtMailListItemSchema) }),
});

export const getCaughtMail = endpoint({
  method: 'get',
  path: '/api/caught-mail/:mailId',
  summary: 'One caught mail',
  params: z.strictObject({ mailId: idSchema }),
  open: true,
  response: caughtMailSchema,
});

export const getCaughtMailFile = endpoint({
  method: 'get',
  path: '/api/caught-mail/:mailId/files/:index',
  summary: 'An attachment of a caught mail',
  params: z.strictObject({ mailId: idSchema, index: z.coerce.number().int().min(0) }),
  open: true,
  sends: '*/*',
});

export type CaughtMail = z.infer<typeof caughtMailSchema>;
