import { useState } from 'react';
import type { CaughtMail } from '#shared/contracts/caught-mail';
import { formatBytes } from '#shared/format/units';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RadioLine } from '../../../components/ui/radio-line';
import { asProblem } from '../../../lib/problem';
import { useCaughtMail } from '../api/caught-mail';
import { linkedText } from '../lib/linked-text';

export function MailInSight({ mailId }: { mailId: string }) {
  const query = useCaughtMail(mailId);
  if (query.error) return <ProblemNotice problem={asProblem(query.error)} />;
  if (!query.data) return <LoadingBars what="Opening the mail." rows={8} />;
  return <Mail mail={query.data} />;
}

type Part = 'text' | 'html';

function Mail({ mail }: { mail: CaughtMail }) {
  const [part, setPart] = useState<Part>('text');
  return (
    <article className="mail" aria-label={mail.subject}>
      <h2>{mail.subject}</h2>
      <p className="small mute">
        from {mail.from} to {mail.to.join(', ')}
      </p>
      <p className="small mute mail-id">
        Message-ID {mail.messageId}
        {mail.inReplyTo ? `, in reply to ${mail.inReplyTo}` : ''}
      </p>
      {mail.files.length > 0 ? (
        <ul className="acts pt-1">
          {mail.files.map((file) => (
            <li key={file.href}>
              <a href={file.href} download={file.name}>
                {file.name}
              </a>{' '}
              <span className="small mute">{formatBytes(file.bytes)}</span>
            </li>
          ))}
        </ul>
      ) : null}
      {mail.html === null ? null : (
        <RadioLine
          label="Part"
          hideLabel
          choices={[
            { value: 'text', label: 'plain text' },
            { value: 'html', label: 'HTML' },
          ]}
          value={part}
          onChange={setPart}
        />
      )}
      {part === 'html' && mail.html !== null ? (
        <iframe className="mail-frame" title={`HTML of ${mail.subject}`} sandbox="" srcDoc={mail.html} />
      ) : (
        <pre className="mail-text">
          {linkedText(mail.text).map((piece) =>
            piece.href === null ? (
              piece.text
            ) : (
              <a key={piece.at} href={piece.href}>
                {piece.text}
              </a>
            ),
          )}
        </pre>
      )}
    </article>
  );
}
