import { createTransport } from 'nodemailer';
import type { Attachment, OutboxRow } from './outbox-sender';

interface Outgoing {
  mail: OutboxRow;
  attachments: Attachment[];
  from: string;
}

export interface MailTransport {
  /** Resolves with the addresses that the server refused while taking the others; rejects where it took none. */
  send(outgoing: Outgoing): Promise<string[]>;
  close(): void;
}

export function createMailTransport(smtpUrl: string): MailTransport {
  const transport = createTransport(smtpUrl, {});
  return {
    async send({ mail, attachments, from }) {
      const info = await transport.sendMail({
        from,
        to: mail.recipients.map(({ name, email }) => ({ name, address: email })),
        cc: mail.copies.map(({ name, email }) => ({ name, address: email })),
        subject: mail.subject,
        text: mail.text,
        html: mail.html,
        messageId: mail.messageId,
        ...(mail.inReplyTo ? { inReplyTo: mail.inReplyTo, references: mail.inReplyTo } : {}),
        date: mail.createdAt,
        attachments: attachments.map(({ fileName, mediaType, bytes }) => ({
          filename: fileName,
          contentType: mediaType,
          content: bytes,
        })),
        // Content comes from our own tables only: no template may make the sender read files or fetch.
        disableFileAccess: true,
        disableUrlAccess: true,
      });
      return info.rejected.map(String);
    },
    close: () => transport.close(),
  };
}
