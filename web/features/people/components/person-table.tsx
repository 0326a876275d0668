import { useMemo, useState } from 'react';
import type { Person } from '#shared/contracts/people';
import { type Role, rolesOf } from '#shared/contracts/roles';
import { Button } from '../../../components/ui/button';
import { CheckboxLine } from '../../../components/ui/checkbox';
import { type DataColumn, DataTable } from '../../../components/ui/data-table';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { usePeople, usePeopleActs } from '../api/people';

/** Which person's form is open under their row. */
interface Open {
  membershipId: string;
  form: 'roles' | 'removal';
}

export function PersonTable() {
  const { people } = usePeople();
  const [open, setOpen] = useState<Open | null>(null);
  const columns = useMemo(() => columnsFor(setOpen), []);
  const close = () => setOpen(null);
  return (
    <DataTable
      caption="People and their roles"
      className="table-head-over table-stacked"
      columns={columns}
      rows={people}
      rowKey={(person) => person.membershipId}
      rowAfter={(person) => {
        if (open?.membershipId !== person.membershipId) return null;
        return open.form === 'roles' ? (
          <RoleForm person={person} onDone={close} />
        ) : (
          <Removal person={person} onDone={close} />
        );
      }}
    />
  );
}

function columnsFor(onOpen: (open: Open) => void): DataColumn<Person>[] {
  return [
    { id: 'name', header: 'Name', rowHeader: true, sortBy: ({ name }) => name, cell: ({ name }) => name },
    {
      id: 'roles',
      header: 'Roles',
      sortBy: ({ roles }) => roles.join(', '),
      cell: ({ roles }) => roles.join(', '),
    },
    {
      id: 'email',
      header: 'E-mail address',
      className: 'mute',
      sortBy: ({ email }) => email,
      cell: ({ email }) => email,
    },
    {
      id: 'acts',
      header: 'Acts',
      hideHeader: true,
      number: true,
      cell: (person) => <PersonActs person={person} onOpen={onOpen} />,
    },
  ];
}

function PersonActs({ person, onOpen }: { person: Person; onOpen: (open: Open) => void }) {
  const { membershipId, name, abilities } = person;
  return (
    <>
      {abilities.change ? (
        <Button
          kind="text"
          onPress={() => onOpen({ membershipId, form: 'roles' })}
          aria-label={`Change the roles of ${name}`}
        >
          Change roles
        </Button>
      ) : null}{' '}
      {abilities.remove ? (
        <Button
          kind="text"
          onPress={() => onOpen({ membershipId, form: 'removal' })}
          aria-label={`Take ${name} out`}
        >
          Take out
        </Button>
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
