import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useShortcuts } from '../../../lib/shortcuts';
import { letterHref, useLetter } from '../api/get-letter';
import { useReturnMail } from '../api/get-return-mail';
import { usePdf } from '../hooks/use-pdf';
import { LetterPage } from './letter-page';

/** The letter's own PDF, page by page, and the text of the mail that carries it. */
export function LetterInSight({
  params,
  version,
  title,
}: {
  params: RevisionParams;
  version: number;
  title: string;
}) {
  const letter = useLetter(params, version);
  const pdf = usePdf(letter.data ?? null);
  const [page, setPage] = useState(1);
  const [showsMail, setShowsMail] = useState(false);
  const pageCount = pdf.document?.numPages ?? 0;
  const shown = Math.min(page, Math.max(pageCount, 1));
  const next = shown < pageCount ? shown + 1 : 1;
  useShortcuts(pageCount > 1 ? [{ key: 'p', label: 'page', foot: true, run: () => setPage(next) }] : []);
  const error = letter.error ?? pdf.error;
  return (
    <section aria-label={title}>
      <div className="letter-bar">
        <b>{title}</b>
        {pageCount > 0 ? (
          <span>
            page {shown} of {pageCount}
          </span>
        ) : null}
        <span className="letter-bar-acts">
          {pageCount > 1 && !showsMail ? (
            <Button kind="inline" onPress={() => setPage(next)}>
              Page {next}
            </Button>
          ) : null}
          <a href={letterHref(params)} target="_blank" rel="noreferrer">
            Open the PDF
          </a>
          <Button kind="inline" onPress={() => setShowsMail(!showsMail)}>
            {showsMail ? 'The letter' : 'E-mail text'}
          </Button>
        </span>
      </div>
      <p className="print-only small py-1">The letter is printed from its own PDF.</p>
      {showsMail ? <MailText params={params} version={version} /> : null}
      {!showsMail && error ? (
        <ProblemNotice problem={asProblem(error)} unaffected="The draft and its items are not affected." />
      ) : null}
      {!showsMail && !error && !pdf.document ? (
        <LoadingBars
          what="Setting the letter."
          rows={10}
          whenLong="The letter is set anew after each change."
        />
      ) : null}
      {!showsMail && pdf.document ? <LetterPage document={pdf.document} page={shown} /> : null}
    </section>
  );
}

function MailText({ params, version }: { params: RevisionParams; version: number }) {
  const mail = useReturnMail(params, version);
  if (mail.error) return <ProblemNotice problem={asProblem(mail.error)} />;
  if (!mail.data) return <LoadingBars what="Writing the e-mail." rows={6} />;
  return (
    <div className="letter-sheet letter-mail">
      <p>
        <b>{mail.data.subject}</b>
      </p>
      <pre>{mail.data.text}</pre>
    </div>
  );
}
