import { Link } from 'react-router-dom';
import { formatInstant } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import { EmptyState } from '../../../components/ui/empty-state';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { TwoHalves } from '../../../components/ui/two-halves';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { useCaughtMails } from '../api/caught-mail';
import { MailInSight } from './mail-in-sight';
import '../caught-mail.css';

/** Mail that was sent to a server on loopback, newest first; nothing of it left this machine. */
export function CaughtMailPage({ mailId }: { mailId: string | null }) {
  usePageTitle('Caught mail');
  const mails = useCaughtMails();
  const shown = mailId ?? mails[0]?.id ?? null;
  return (
    <TwoHalves
      work={
        <>
          <PageHead
            title="Caught mail"
            rest={countInFigures(mails.length, 'mail')}
            lede="Nothing of it left this machine."
          />
          {mails.length === 0 ? (
            <EmptyState title="No mail has been caught yet.">
              Receipts, invitations and returns stand here as soon as they are sent.
            </EmptyState>
          ) : (
            <ol className="mail-list">
              {mails.map((mail) => (
                <li key={mail.id}>
                  <Link
                    className="plain"
                    to={paths.oneCaughtMail(mail.id)}
                    aria-current={mail.id === shown ? 'true' : undefined}
                  >
                    <b>{mail.subject}</b>
                    <span className="mute">
                      to {mail.to.join(', ')} · {formatInstant(mail.caughtAt, 'UTC')} UTC
                      {mail.attachments > 0 ? ` · ${enclosed(mail.attachments)}` : ''}
                    </span>
                  </Link>
                </li>
              ))}
            </ol>
          )}
        </>
      }
      sight={
        <>
          {shown ? <MailInSight key={shown} mailId={shown} /> : null}
          <RunningFoot texts={['Development and demo only.']} />
        </>
      }
    />
  );
}

function enclosed(count: number): string {
  return countInFigures(count, 'enclosure');
}
