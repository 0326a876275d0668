import type { Role } from '#shared/contracts/roles';
import { formatDate } from '#shared/format/dates';
import { type MailContent, mailContent } from './mail-content';

interface InvitationMail {
  name: string;
  invitedBy: string;
  organisation: string;
  roles: readonly Role[];
  /** Calendar date. */
  expiresOn: string;
  address: string;
}

export function invitationMail(invitation: InvitationMail): MailContent {
  return mailContent({
    subject: `${invitation.organisation} invites you to Clauseway`,
    paragraphs: [
      `${invitation.name},`,
      `${invitation.invitedBy} invites you to act for ${invitation.organisation} as ${invitation.roles.join(', ')}.`,
      `Accept at ${invitation.address}`,
      `The link works once, until ${formatDate(invitation.expiresOn)}. If you did not expect it, leave it.`,
    ],
  });
}

export function passwordResetMail({ name, address }: { name: string; address: string }): MailContent {
  return mailContent({
    subject: 'Set a new password for Clauseway',
    paragraphs: [
      `${name},`,
      `Set a new password at ${address}`,
      'The link works once, for one hour. Setting it ends every session of yours. If you did not ask for it, leave it.',
    ],
  });
}
