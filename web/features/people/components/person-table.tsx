import { useState } from 'react';
import type { Person } from '#shared/contracts/people';
import { type Role, rolesOf } from '#shared/contracts/roles';
import { Button } from '../../../components/ui/button';
import { CheckboxLine } from '../../../components/ui/checkbox';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { usePeople, usePeopleActs } from '../api/people';

export function PersonTable() {
  const { people } = usePeople();
  return (
    <table className="table table-head-over table-stacked">
      <caption className="hidden-text">People and their roles</caption>
      <thead>
        <tr>
          <th scope="col">Name</th>
          <th scope="col">Roles</th>
          <th scope="col">E-mail address</th>
          <th scope="col" className="number">
            <span className="hidden-text">Acts</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <PersonRow key={person.membershipId} person={person} />
        ))}
      </tbody>
    </table>
  );
}

type Open = 'roles' | 'removal' | null;

function PersonRow({ person }: { person: Person }) {
  const [open, setOpen] = useState<Open>(null);
  return (
    <>
      <tr>
        <th scope="row">{person.name}</th>
        <td>{person.roles.join(', ')}</td>
        <td className="mute">{person.email}</td>
        <td className="number">
          {person.abilities.change ? (
            <Button
              kind="text"
              onPress={() => setOpen('roles')}
              aria-label={`Change the roles of ${person.name}`}
            >
              Change roles
            </Button>
          ) : null}{' '}
          {person.abilities.remove ? (
            <Button kind="text" onPress={() => setOpen('removal')} aria-label={`Take ${person.name} out`}>
              Take out
            </Button>
          ) : null}
        </td>
      </tr>
      {open ? (
        <tr>
          <td colSpan={4}>
            {open === 'roles' ? (
              <RoleForm person={person} onDone={() => setOpen(null)} />
            ) : (
              <Removal person={person} onDone={() => setOpen(null)} />
            )}
          </td>
        </tr>
      ) : null}
    </>
  );
}

function RoleForm({ person, onDone }: { person: Person; onDone: () => void }) {
  const { active } = useSession();
  const acts = usePeopleActs();
  const [roles, setRoles] = useState<Role[]>(person.roles);
  const { send, error, isSending } = useAct(onDone);
  const choices = rolesOf(active?.kind ?? 'contractor').map((role) => ({ value: role, label: role }));
  const wanted = roles.length === 0 ? 'Choose at least one role.' : undefined;
  return (
    <>
      {error ? <ProblemNotice problem={asProblem(error)} unaffected="The roles are as they were." /> : null}
      <CheckboxLine
        label={`Roles of ${person.name}`}
        choices={choices}
        values={roles}
        onChange={setRoles}
        error={wanted}
      />
      <div className="acts">
        <Button
          isDisabled={roles.length === 0}
          isPending={isSending}
          onPress={() => send(acts.changeRoles(person, roles))}
        >
          Keep the roles
        </Button>
        <Button kind="text" onPress={onDone}>
          Leave them
        </Button>
      </div>
    </>
  );
}

function Removal({ person, onDone }: { person: Person; onDone: () => void }) {
  const acts = usePeopleActs();
  const { send, error, isSending } = useAct(onDone);
  return (
    <>
      {error ? <ProblemNotice problem={asProblem(error)} /> : null}
      <p>
        {person.name} can then no longer act for the organisation. Notes, decisions and submissions of{' '}
        {person.name} stay.
      </p>
      <div className="acts pt-2">
        <Button isPending={isSending} onPress={() => send(acts.remove(person))}>
          Take {person.name} out
        </Button>
        <Button kind="text" onPress={onDone}>
          Leave it
        </Button>
      </div>
    </>
  );
}

function useAct(onDone: () => void) {
  const [error, setError] = useState<unknown>(null);
  const [isSending, setIsSending] = useState(false);
  const send = async (act: Promise<unknown>) => {
    setIsSending(true);
    setError(null);
    try {
      await act;
      onDone();
    } catch (thrown) {
      setError(thrown);
    } finally {
      setIsSending(false);
    }
  };
  return { send, error, isSending };
}
