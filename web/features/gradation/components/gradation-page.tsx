import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { checkCautions } from '#shared/cautions';
import { findingFragment } from '#shared/format/finding-key';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { usePrintedRevision } from '../../../lib/print-frame';
import { useCheck } from '../../../lib/queries/check-query';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { GradationAside } from './gradation-aside';
import { GradationChart } from './gradation-chart';
import { GradationTable } from './gradation-table';

export function GradationPage() {
  const params = useRevisionParams();
  const revision = useRevision(params);
  const check = useCheck(params);
  const [asTable, setAsTable] = useState(false);
  usePageTitle(`Gradation, ${revision.mixDesignation} revision ${revision.number}`);
  usePrintedRevision(revision);
  const { gradation } = check;
  const findings = check.findings.filter((finding) => finding.kind === 'gradation');
  const first = findings[0];
  const back = paths.revision(params.submittalId, params.number);
  const navigate = useNavigate();
  useShortcuts([
    { key: 't', label: 'table', run: () => setAsTable((now) => !now), foot: true },
    { key: 'Escape', label: 'back', run: () => void navigate(back), foot: true },
  ]);
  return (
    <MarginPage marginWidthPx={300} aside={<GradationAside findings={findings} revisionPath={back} />}>
      <PageHead
        kicker={
          <>
            <Link to={back}>
              {revision.mixDesignation} revision {revision.number}
            </Link>
            {first?.clause ? (
              <>
                {' · '}
                <Link className="plain" to={`${back}#${findingFragment(first)}`}>
                  {first.clause}
                </Link>
              </>
            ) : null}
          </>
        }
        title="Gradation"
        rest="of the job mix, sieve opening to the power 0.45"
        lede={revision.description}
      />
      {gradation === null || gradation.points.length === 0 ? (
        <EmptyState title="The workbook states no gradation of the job mix.">
          <Link to={paths.reading(params.submittalId, params.number)}>See how it was read</Link>
        </EmptyState>
      ) : (
        <>
          {asTable ? null : (
            <GradationChart
              points={gradation.points}
              maximumSizeMm={gradation.maximumSizeMm}
              params={params}
            />
          )}
          <div className="acts pt-2 pb-2">
            <Button kind="text" onPress={() => setAsTable(!asTable)}>
              {asTable ? 'Show as a chart' : 'Show as a table'}
            </Button>
          </div>
          {asTable ? <GradationTable points={gradation.points} params={params} /> : null}
        </>
      )}
      <RunningFoot texts={checkCautions(check.startingPoint)} />
    </MarginPage>
  );
}
