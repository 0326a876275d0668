import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { paths } from '../../../lib/paths';
import { asProblem, type Problem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useChooseOrganisation } from '../api/choose-organisation';

export function ChooseOrganisationPage() {
  usePageTitle('Choose an organisation');
  const { memberships, active } = useSession();
  const choose = useChooseOrganisation();
  const navigate = useNavigate();
  const [problem, setProblem] = useState<Problem | null>(null);
  const actFor = async (organisationId: string) => {
    setProblem(null);
    try {
      await choose(organisationId);
      await navigate(paths.home);
    } catch (error) {
      setProblem(asProblem(error));
    }
  };
  return (
    <PlainPage>
      <PageHead
        title="Choose an organisation"
        lede="What you see and may do follows from the organisation you act for."
      />
      {problem ? <ProblemNotice problem={problem} /> : null}
      {memberships.length === 0 ? (
        <EmptyState title="You belong to no organisation.">
          Ask an administrator of your agency or contractor to invite you.
        </EmptyState>
      ) : (
        <table className="table table-head-over table-stacked form-column">
          <thead>
            <tr>
              <th scope="col">Organisation</th>
              <th scope="col">Your roles</th>
              <th scope="col" className="number">
                <span className="hidden-text">Act</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {memberships.map(({ organisationId, organisationName, kind, roles }) => (
              <tr key={organisationId}>
                <th scope="row">
                  {organisationName} <span className="mute font-normal">{kind}</span>
                </th>
                <td>{roles.join(', ')}</td>
                <td className="number">
                  {organisationId === active?.organisationId ? (
                    <span className="mute">chosen</span>
                  ) : (
                    <Button
                      kind="text"
                      onPress={() => actFor(organisationId)}
                      aria-label={`Act for ${organisationName}`}
                    >
                      Act for it
                    </Button>
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </PlainPage>
  );
}
