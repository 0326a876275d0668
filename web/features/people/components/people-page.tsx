import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { ContractorList } from './contractor-list';
import { InvitationList } from './invitation-list';
import { InviteForm } from './invite-form';
import { PersonTable } from './person-table';

export function PeoplePage() {
  usePageTitle('People');
  const { active, abilities } = useSession();
  return (
    <PlainPage>
      <PageHead title="People" rest={active?.organisationName} />
      <PersonTable />
      <InvitationList />
      {abilities.managePeople ? <InviteForm /> : null}
      {active?.kind === 'agency' ? <ContractorList /> : null}
      <RunningFoot texts={['What a person did stays when the person leaves.']} />
    </PlainPage>
  );
}
