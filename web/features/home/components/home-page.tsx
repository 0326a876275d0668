import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { formatDateWithWeekday } from '#shared/format/dates';
import { LinkButton } from '../../../components/ui/button';
import { FileDrop } from '../../../components/ui/file-drop';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { announce } from '../../../lib/announce';
import { handOverFile } from '../../../lib/handed-over-file';
import { addressOfRevision } from '../../../lib/next-address';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { useHome } from '../api/get-home';
import { CurrentRevision, submitAddress } from './current-revision';
import { History } from './history';
import { HomeMargin } from './home-margin';
import { MixTable, mixRowId } from './mix-table';
import '../home.css';

export function HomePage() {
  usePageTitle('Home');
  const home = useHome();
  const { active, today } = useSession();
  const { cursor, setCursor } = useHomeKeys();
  const { current } = home;
  const navigate = useNavigate();
  const upload = (file: File) => {
    handOverFile(file);
    void navigate(paths.upload);
  };
  return (
    <MarginPage marginWidthPx={300} aside={<HomeMargin home={home} />}>
      <PageHead title={active?.organisationName} rest={formatDateWithWeekday(today)} />
      {home.abilities.upload ? (
        <FileDrop
          title="Drop a workbook to check it"
          help=".xlsx or .csv, in your laboratory’s own layout or the template. Nothing is sent until you submit."
          button="Choose a file"
          keyHint="U"
          accept={['.xlsx', '.csv', '.tsv']}
          onFile={upload}
        />
      ) : null}
      <MixTable submittals={home.submittals} cursor={cursor} onCursor={setCursor} />
      {current ? (
        <>
          <CurrentRevision current={current} />
          <History
            mixDesignation={current.mixDesignation}
            timeZone={current.timeZone}
            revisions={current.history}
          />
        </>
      ) : null}
      <RunningFoot
        texts={[cautions.findings, 'The agency’s own check decides; the contract documents govern.']}
        acts={
          <>
            {home.abilities.upload ? <LinkButton to={paths.upload}>Check a workbook</LinkButton> : null}
            {current?.canSubmit ? (
              <LinkButton kind="primary" to={submitAddress(current)}>
                Submit revision {current.revision}
              </LinkButton>
            ) : null}
          </>
        }
      />
    </MarginPage>
  );
}

function useHomeKeys() {
  const { submittals, current, abilities } = useHome();
  const navigate = useNavigate();
  const [chosen, setCursor] = useState<string | null>(null);
  const index = Math.max(
    submittals.findIndex((submittal) => submittal.id === chosen),
    0,
  );
  const at = submittals[index];
  const step = (by: 1 | -1) => {
    const next = submittals[Math.min(Math.max(index + (chosen === null ? 0 : by), 0), submittals.length - 1)];
    if (!next) return;
    setCursor(next.id);
    document.getElementById(mixRowId(next.id))?.scrollIntoView({ block: 'nearest' });
    announce(`${next.mixDesignation} revision ${next.revision.number}, ${next.next}`);
  };
  useShortcuts([
    ...(abilities.upload
      ? [{ key: 'u', label: 'upload', foot: true, run: () => void navigate(paths.upload) }]
      : []),
    { key: 'j', label: 'next', foot: true, run: () => step(1) },
    { key: 'k', label: 'previous', run: () => step(-1) },
    {
      key: 'Enter',
      label: 'open',
      foot: true,
      run: () => at && navigate(addressOfRevision(at.id, at.revision)),
    },
    ...(current?.canSubmit
      ? [{ key: 's', label: 'submit', foot: true, run: () => void navigate(submitAddress(current)) }]
      : []),
  ]);
  return { cursor: chosen, setCursor };
}
