import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useReplaceWorkbook } from '../api/upload-workbook';
import { ChosenWorkbook } from './chosen-workbook';
import { ReadingProgress } from './reading-progress';
import { ReplacedWorkbooks } from './replaced-workbooks';

/** The workbook of a draft: how far its reading is, why it failed, and another one in its place. */
export function WorkbookPage({ params, justUploaded }: { params: RevisionParams; justUploaded: boolean }) {
  const revision = useRevision(params);
  usePageTitle(`Workbook of ${revision.mixDesignation} revision ${revision.number}`);
  const [isFollowed, setIsFollowed] = useState(justUploaded || revision.job?.state !== 'done');
  const navigate = useNavigate();
  const { templateHref } = revision.section;
  return (
    <PlainPage>
      <PageHead
        kicker={`${revision.project.number} ${revision.project.title} · revision ${revision.number} of ${revision.mixDesignation}`}
        title={isFollowed ? 'Reading the workbook' : 'Upload the workbook again'}
        rest={revision.workbook?.fileName}
      />
      <div className="form-column">
        {isFollowed ? (
          <ReadingProgress
            key={revision.job?.id}
            params={params}
            templateHref={templateHref}
            onRead={(read) => void navigate(paths.reading(read.submittalId, read.number), { replace: true })}
          />
        ) : (
          <p className="pb-2">
            The workbook was read.{' '}
            <Link to={paths.reading(params.submittalId, params.number)}>See how it was read</Link>
          </p>
        )}
        {revision.abilities.replaceWorkbook ? (
          <Replacement revision={revision} onReplaced={() => setIsFollowed(true)} />
        ) : null}
        <ReplacedWorkbooks params={params} replaced={revision.replacedWorkbooks} />
      </div>
    </PlainPage>
  );
}

function Replacement({
  revision,
  onReplaced,
}: {
  revision: ReturnType<typeof useRevision>;
  onReplaced: () => void;
}) {
  const replace = useReplaceWorkbook(revision);
  const [file, setFile] = useState<File | null>(null);
  const [error, setError] = useState<unknown>(null);
  const send = async (chosen: File) => {
    setFile(chosen);
    setError(null);
    try {
      await replace(chosen);
      setFile(null);
      onReplaced();
    } catch (thrown) {
      setError(thrown);
    }
  };
  const isSending = file !== null && error === null;
  return (
    <section aria-label="Another workbook in its place" className="pt-4">
      {error ? (
        <ProblemNotice problem={asProblem(error)} unaffected="The workbook before it is kept." />
      ) : null}
      <ChosenWorkbook file={file} onFile={(chosen) => void send(chosen)} isDisabled={isSending} />
      <p className="small mute pt-2">
        The new workbook takes the place of the present one; revision {revision.number} keeps its number. The
        replaced file stays with you only.{' '}
        <a href={revision.section.templateHref} download>
          Template of this section
        </a>
      </p>
    </section>
  );
}
