import { getCaughtMail, getCaughtMailFile, listCaughtMail } from '#shared/contracts/caught-mail';
import { findCaughtMail, listCaughtMails } from '../../db/queries/caught-mails';
import { presentCaughtMail, presentCaughtMailItem } from '../../presenters/present-caught-mail';
import { Problem } from '../../problem';
import { openRoute } from '../define-route';

/** Registered only where mail is caught, and open there: links in mails are for people who cannot sign in yet. */
export const caughtMailRoutes = [
  openRoute(listCaughtMail, async ({ deps }) => ({
    mails: (await listCaughtMails(deps.db)).map(presentCaughtMailItem),
  })),
  openRoute(getCaughtMail, async ({ deps, params }) => {
    const mail = await findCaughtMail(deps.db, params.mailId);
    if (!mail) throw new Problem('not-found');
    return presentCaughtMail(mail);
  }),
  openRoute(getCaughtMailFile, async ({ deps, params }) => {
    const mail = await findCaughtMail(deps.db, params.mailId);
    if (!mail) throw new Problem('not-found');
    const { simpleParser } = await import('mailparser');
    const file = (await simpleParser(mail.source)).attachments[params.index];
    if (!file) throw new Problem('not-found');
    return {
      bytes: file.content,
      mediaType: file.contentType,
      fileName: file.filename ?? `attachment ${params.index + 1}`,
    };
  }),
];
