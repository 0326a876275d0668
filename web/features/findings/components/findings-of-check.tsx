import { useMemo } from 'react';
import type { Revision } from '#shared/contracts/submittals';
import { MarginPage } from '../../../components/ui/margin-page';
import { useCheck } from '../../../lib/queries/check-query';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useTakeRevision } from '../api/take-revision';
import { useAddressRow } from '../hooks/use-address-row';
import { useLedgerKeys } from '../hooks/use-ledger-keys';
import { useLedgerState } from '../hooks/use-ledger-state';
import { useRenewWhileRunning } from '../hooks/use-renew-while-running';
import { FindingsFoot } from './findings-foot';
import { Ledger } from './ledger';
import { LedgerContext } from './ledger-context';
import { LedgerTools } from './ledger-tools';
import { OutcomeIndex } from './outcome-index';
import { Recommendation } from './recommendation';
import { RevisionHead } from './revision-head';
import { StaleLine } from './stale-line';
import { SubmitSection } from './submit-section';

export function FindingsOfCheck({ params, revision }: { params: RevisionParams; revision: Revision }) {
  const check = useCheck(params);
  const state = useLedgerState(check);
  useAddressRow(state);
  useLedgerKeys(state, revision);
  const { job } = revision;
  useRenewWhileRunning(params, job !== null && (job.state === 'waiting' || job.state === 'running'));
  const take = useTakeRevision(params, revision.version);
  const { open, toggle, unfolded, setUnfolded, draft, setDraft } = state;
  const context = useMemo(
    () => ({
      params,
      revision,
      check,
      timeZone: revision.agency.timeZone,
      open,
      toggle,
      unfolded,
      setUnfolded,
      draft,
      setDraft,
      take,
    }),
    [
      params,
      revision,
      check,
      revision.agency.timeZone,
      open,
      toggle,
      unfolded,
      setUnfolded,
      draft,
      setDraft,
      take,
    ],
  );
  return (
    <LedgerContext value={context}>
      <MarginPage>
        <div className="page-split">
          <div className="min-w-0">
            <RevisionHead revision={revision}>
              <OutcomeIndex rows={state.rows} />
            </RevisionHead>
          </div>
          <Recommendation />
        </div>
        {check.stale ? <StaleLine reason={check.stale} /> : null}
        {revision.abilities.submit && check.declaration ? (
          <SubmitSection declaration={check.declaration} seal={check.seal.seal} />
        ) : null}
        <LedgerTools order={state.order} />
        <Ledger groups={state.groups} />
        <FindingsFoot />
      </MarginPage>
    </LedgerContext>
  );
}
