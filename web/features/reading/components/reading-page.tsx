import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { checkCautions } from '#shared/cautions';
import { shortHash } from '#shared/format/short-hash';
import { LinkButton } from '../../../components/ui/button';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { usePrintedRevision } from '../../../lib/print-frame';
import { asProblem } from '../../../lib/problem';
import { checkQuery } from '../../../lib/queries/check-query';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import { useMediaQuery } from '../../../lib/use-media-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useReading } from '../api/get-reading';
import { useKeepAttributes } from '../api/keep-attributes';
import { useChosenCells } from '../hooks/use-chosen-cells';
import { answerAct, useProposedAnswer } from '../hooks/use-proposed-answer';
import { useReadingActs } from '../hooks/use-reading-acts';
import { useReadingKeys } from '../hooks/use-reading-keys';
import { firstPlace } from '../lib/first-place';
import { focusSoon } from '../lib/focus-soon';
import { sheetGridId } from '../lib/sheet-measures';
import { AskedAttributes } from './asked-attributes';
import { CellPanel } from './cell-panel';
import { DocumentList } from './document-list';
import { DoubtExcerpt } from './doubt-excerpt';
import { DoubtList } from './doubt-list';
import { FindingsBeside } from './findings-beside';
import { MappingNotice } from './mapping-notice';
import { Onward } from './onward';
import { Proposal } from './proposal';
import { NotUsed, Understood } from './reading-lists';
import { ReadingSteps } from './reading-steps';
import { ReplaceWorkbook } from './replace-workbook';
import { SaidList } from './said-list';
import { SheetView } from './sheet-view';
import { StaleAnswers } from './stale-answers';
import { TypedList } from './typed-list';
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
  const acts = useReadingActs(params);
  const attributes = useKeepAttributes(params);
  const answering = useProposedAnswer({ reading, acts, onCursor: setCursor });
  const [isAsking, setIsAsking] = useState(false);
  const ask = () => {
    if (!reading.abilities.answer) return;
    setIsAsking(true);
    focusSoon('cell-panel');
  };
  const stopAsking = () => {
    setIsAsking(false);
    focusSoon(sheetGridId);
  };
  useReadingKeys({
    reading,
    cursor,
    onCursor: setCursor,
    onPropose: answering.propose,
    proposal: answering.proposed ? answering : null,
    acts,
    onFindings: useOpenFindings(params),
  });
  const isNarrow = useMediaQuery('screen and (max-width: 759px)');

  const problem = acts.error ?? attributes.error;
  const head = (
    <>
      <PageHead
        kicker={`${revision.project.number} ${revision.project.title} · revision ${revision.number} of ${revision.mixDesignation}`}
        title="How the workbook was read"
        rest={reading.fileName}
      >
        <ReadingSteps params={params} hasCheck={revision.hasCheck} />
      </PageHead>
      {reading.mapping ? (
        <MappingNotice params={params} mapping={reading.mapping} laboratory={revision.laboratory.name} />
      ) : null}
      {problem ? (
        <ProblemNotice problem={asProblem(problem)} unaffected="Answers kept before still hold." />
      ) : null}
    </>
  );
  const panel = isAsking ? (
    <CellPanel params={params} reading={reading} chosen={chosen} acts={acts} onClose={stopAsking} />
  ) : null;
  const questions = (
    <>
      <DoubtList
        doubts={reading.doubts}
        cursor={cursor}
        onCursor={setCursor}
        proposed={answering.proposed}
        onPropose={answering.propose}
        proposalOf={({ doubt, answer }) => (
          <Proposal
            params={params}
            version={reading.version}
            act={answerAct(doubt, answer)}
            keepLabel={answer === null ? 'Take it back' : 'Keep the answer'}
            keyHint="Enter"
            onKeep={answering.keep}
            onLeave={answering.leave}
            isKeeping={acts.isPending}
          />
        )}
        canAnswer={reading.abilities.answer}
        {...(isNarrow ? { excerptOf: (doubt) => <DoubtExcerpt params={params} doubt={doubt} /> } : {})}
      />
      <StaleAnswers stale={reading.stale} />
      <AskedAttributes
        asked={reading.asked}
        onKeep={(name, value) => attributes.mutate({ [name]: value })}
        canAnswer={reading.abilities.answer}
      />
      <SaidList params={params} reading={reading} acts={acts} />
      {check.data ? <FindingsBeside params={params} check={check.data} /> : null}
      <Onward params={params} reading={reading} laboratory={revision.laboratory.name} />
    </>
  );
  const lists = (
    <>
      <Understood params={params} reading={reading} />
      <NotUsed params={params} reading={reading} />
      <TypedList params={params} reading={reading} acts={acts} />
      <DocumentList params={params} reading={reading} />
      {revision.abilities.replaceWorkbook ? <ReplaceWorkbook revision={revision} /> : null}
    </>
  );
  const sheet = <SheetView params={params} reading={reading} chosen={chosen} onOpen={ask} />;
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
        {panel}
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
          {panel}
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

function useOpenFindings({ submittalId, number }: RevisionParams): () => void {
  const navigate = useNavigate();
  return () => void navigate(paths.revision(submittalId, number));
}
