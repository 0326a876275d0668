import { useState } from 'react';
import type { Invitation } from '#shared/contracts/people';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { Mark } from '../../../components/ui/mark';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { usePeople, usePeopleActs } from '../api/people';

export function InvitationList() {
  const { invitations } = usePeople();
  const { timeZone, abilities } = useSession();
  const acts = usePeopleActs();
  const [error, setError] = useState<unknown>(null);
  if (invitations.length === 0) return null;
  const withdraw = async (invitation: Invitation) => {
    setError(null);
    await acts.withdraw(invitation).catch(setError);
  };
  return (
    <section>
      <SectionHead title="Invited" about="open until accepted, withdrawn or expired" />
      {error ? <ProblemNotice problem={asProblem(error)} /> : null}
      <table className="table table-stacked">
        <caption className="hidden-text">Open invitations</caption>
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">Roles</th>
            <th scope="col">E-mail address</th>
            <th scope="col">Mail</th>
            <th scope="col">Expires</th>
            <th scope="col" className="number">
              <span className="hidden-text">Acts</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {invitations.map((invitation) => (
            <tr key={invitation.id}>
              <th scope="row">
                {invitation.name} <span className="mute font-normal">{invitation.organisation}</span>
              </th>
              <td>{invitation.roles.join(', ')}</td>
              <td className="mute">{invitation.email}</td>
              <td>
                {invitation.mail === 'failed' ? <Mark name="fail" /> : null} {invitation.mail}
              </td>
              <td>{formatDate(dateOfInstant(invitation.expiresOn, timeZone))}</td>
              <td className="number">
                {abilities.managePeople ? (
                  <Button
                    kind="text"
                    onPress={() => void withdraw(invitation)}
                    aria-label={`Withdraw the invitation of ${invitation.name}`}
                  >
                    Withdraw
                  </Button>
                ) : null}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
