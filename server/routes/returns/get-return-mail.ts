import { getReturnMail } from '#shared/contracts/returns';
import { loadReturn } from '../../commands/returns/load-return';
import { previewInput } from '../../commands/returns/preview-input';
import { returnAddress } from '../../commands/returns/return-address';
import { mailsOfReturn } from '../../db/queries/returns';
import { returnMail } from '../../mail/templates/return-mail';
import { route } from '../define-route';

export const getReturnMailRoute = route(getReturnMail, async ({ deps, actor, params }) => {
  const found = await loadReturn(deps, actor, params);
  const [sent] = found.kept?.state === 'sent' ? await mailsOfReturn(deps.db, actor, found.kept.id) : [];
  if (sent !== undefined) return { subject: sent.subject, text: sent.text };
  const { subject, text } = returnMail(previewInput(deps, found), {
    address: returnAddress(deps.settings, found.row),
  });
  return { subject, text };
});
