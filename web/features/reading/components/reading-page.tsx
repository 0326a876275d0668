import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { checkCautions } from '#shared/cautions';
import type { ReadingView } from '#shared/contracts/readings';
import { shortHash } from '#shared/format/short-hash';
import { LinkButton } from '../../../components/ui/button';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RunningFoot } from '../../../components/ui/running-foot';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { usePrintedRevision } from '../../../lib/print-frame';
import { asProblem } from '../../../lib/problem';
import { checkQuery } from '../../../lib/queries/check-query';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import { useMediaQuery } from '../../../lib/use-media-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useReading } from '../api/get-reading';
import { useKeepAnswers } from '../api/keep-answers';
import { useKeepAttributes } from '../api/keep-attributes';
import { useChosenCells } from '../hooks/use-chosen-cells';
import { useReadingKeys } from '../hooks/use-reading-keys';
import { doubtsLeftWords, type ReadingDoubt } from '../lib/doubt-answers';
import { firstPlace } from '../lib/first-place';
import { AskedAttributes } from './asked-attributes';
import { DocumentList } from './document-list';
import { DoubtExcerpt } from './doubt-excerpt';
import { DoubtList } from './doubt-list';
import { NotUsed, Understood } from './reading-lists';
import { ReadingSteps } from './reading-steps';
import { ReplaceWorkbook } from './replace-workbook';
import { SheetView } from './sheet-view';
import { StaleAnswers } from './stale-answers';
import '../reading.css';

export function ReadingPage({ params }: { params: RevisionParams }) {
  const reading = useReading(params);
  const revision = useRevision(params);
  usePageTitle(`Reading of ${revision.mixDesignation} revision ${revision.number}`);
  usePrintedRevision(revision);
  const chosen = useChosenCells(params, firstPlace(reading));
  const { cursor, setCursor } = chosen;
  // At hand before anything is changed, so that the page can say which outcomes a change moved.
  const check = useQuery({ ...checkQuery(params), enabled: revision.hasCheck });
  const answers = useKeepAnswers(params);
  const attributes = useKeepAttributes(params);
  const answer = (doubt: ReadingDoubt, value: string | null) => {
    if (!reading.abilities.answer) return;
    const { sheet, cell, text } = doubt;
    answers.mutate([{ sheet, cell, text, answer: value }], {
      onSuccess: (kept) => announce(doubtsLeftWords(kept.doubts)),
    });
  };
  const openFindings = useOpenFindings(params);
  useReadingKeys({ reading, cursor, onCursor: setCursor, onAnswer: answer, onFindings: openFindings });
  const isNarrow = useMediaQuery('screen and (max-width: 759px)');

  const problem = answers.error ?? attributes.error;
  const head = (
    <>
      <PageHead
        kicker={`${revision.project.number} ${revision.project.title} · revision ${revision.number} of ${revision.mixDesignation}`}
        title="How the workbook was read"
        rest={reading.fileName}
      >
        <ReadingSteps params={params} hasCheck={revision.hasCheck} />
      </PageHead>
      {problem ? (
        <ProblemNotice problem={asProblem(problem)} unaffected="Answers kept before still hold." />
      ) : null}
    </>
  );
  const questions = (
    <>
      <DoubtList
        doubts={reading.doubts}
        cursor={cursor}
        onCursor={setCursor}
        onAnswer={answer}
        canAnswer={reading.abilities.answer}
        {...(isNarrow ? { excerptOf: (doubt) => <DoubtExcerpt params={params} doubt={doubt} /> } : {})}
      />
      <StaleAnswers stale={reading.stale} />
      <AskedAttributes
        asked={reading.asked}
        onKeep={(name, value) => attributes.mutate({ [name]: value })}
        canAnswer={reading.abilities.answer}
      />
      <Onward params={params} reading={reading} laboratory={revision.laboratory.name} />
    </>
  );
  const lists = (
    <>
      <Understood params={params} reading={reading} />
      <NotUsed params={params} reading={reading} />
      <DocumentList params={params} reading={reading} />
      {revision.abilities.replaceWorkbook ? <ReplaceWorkbook revision={revision} /> : null}
    </>
  );
  const sheet = <SheetView params={params} reading={reading} chosen={chosen} onOpen={() => undefined} />;
  const foot = (
    <RunningFoot
      texts={[
        `SHA-256 of the file ${shortHash(reading.sha256)}, kept as uploaded`,
        `Read with the mapping ${reading.mappingName}`,
        ...checkCautions(check.data?.startingPoint === true),
      ]}
      acts={
        <LinkButton kind="primary" to={paths.revision(params.submittalId, params.number)}>
          See the findings
        </LinkButton>
      }
    />
  );
  if (isNarrow) {
    return (
      <MarginPage>
        {head}
        {questions}
        {sheet}
        {lists}
        {foot}
      </MarginPage>
    );
  }
  return (
    <MarginPage
      marginWidthPx={380}
      aside={
        <div className="reading-side">
          {questions}
          {lists}
        </div>
      }
    >
      {head}
      {sheet}
      {foot}
    </MarginPage>
  );
}

function Onward({
  params,
  reading,
  laboratory,
}: {
  params: RevisionParams;
  reading: ReadingView;
  laboratory: string;
}) {
  return (
    <div className="onward">
      <LinkButton kind="primary" keyHint="Enter" to={paths.revision(params.submittalId, params.number)}>
        See the findings
      </LinkButton>
      <span className="small mute">
        {doubtsLeftWords(reading.doubts)} Read for {laboratory}.
      </span>
    </div>
  );
}

function useOpenFindings({ submittalId, number }: RevisionParams): () => void {
  const navigate = useNavigate();
  return () => void navigate(paths.revision(submittalId, number));
}
