import { simpleParser } from 'mailparser';
import { getCaughtMail, getCaughtMailFile, listCaughtMail } from '#shared/contracts/caught-mail';
import { findCaughtMail, listCaughtMails } from '../../db/queries/caught-mails';
import { presentCaughtMail, presentCaughtMailItem } from '../../presenters/present-caught-mail';
import { Problem } from '../../problem';
import { route } from '../define-route';

/** Registered only where mail is caught: everybody who is signed in there may read all of it. */
export const caughtMailRoutes = [
  route(listCaughtMail, async ({ deps }) => ({
    mails: (await listCaughtMails(deps.db)).map(presentCaughtMailItem),
  })),
  route(getCaughtMail, async ({ deps, params }) => {
    const mail = await findCaughtMail(deps.db, params.mailId);
    if (!mail) throw new Problem('not-found');
    return presentCaughtMail(mail);
  }),
  route(getCaughtMailFile, async ({ deps, params }) => {
    const mail = await findCaughtMail(deps.db, params.mailId);
    if (!mail) throw new Problem('not-found');
    const file = (await simpleParser(mail.source)).attachments[params.index];
    if (!file) throw new Problem('not-found');
    return {
      bytes: file.content,
      mediaType: file.contentType,
      fileName: file.filename ?? `attachment ${params.index + 1}`,
    };
  }),
];
