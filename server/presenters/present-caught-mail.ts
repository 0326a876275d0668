import type { z } from 'zod';
import type { CaughtMail, caughtMailListItemSchema } from '#shared/contracts/caught-mail';
import type { CaughtMailRow } from '../db/queries/caught-mails';

export function presentCaughtMailItem(row: CaughtMailRow): z.infer<typeof caughtMailListItemSchema> {
  return {
    id: row.id,
    caughtAt: row.caughtAt.toISOString(),
    from: row.sender,
    to: row.recipients,
    subject: row.subject,
    attachments: row.attachments,
  };
}

/** Parsed from the message as it came over the wire, as a mail program would. */
export async function presentCaughtMail(row: CaughtMailRow & { source: Buffer }): Promise<CaughtMail> {
  const { simpleParser } = await import('mailparser');
  const parsed = await simpleParser(row.source);
  return {
    ...presentCaughtMailItem(row),
    messageId: parsed.messageId ?? '',
    inReplyTo: parsed.inReplyTo ?? null,
    text: parsed.text ?? '',
    html: parsed.html || null,
    files: parsed.attachments.map((file, index) => ({
      name: file.filename ?? `attachment ${index + 1}`,
      mediaType: file.contentType,
      bytes: file.size,
      href: `/api/caught-mail/${row.id}/files/${index}`,
    })),
  };
}
