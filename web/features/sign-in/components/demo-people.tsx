import { useState } from 'react';
import type { DemoPerson } from '#shared/contracts/session';
import { Button } from '../../../components/ui/button';
import { SectionHead } from '../../../components/ui/section-head';

/** The demo's people by role; the server lists them only while the demo seed is present. */
export function DemoPeople({
  people,
  onEnter,
}: {
  people: readonly DemoPerson[];
  onEnter: (person: DemoPerson) => Promise<void>;
}) {
  const [entering, setEntering] = useState<string | null>(null);
  const enter = async (person: DemoPerson) => {
    setEntering(person.email);
    await onEnter(person);
    setEntering(null);
  };
  return (
    <section aria-labelledby="demo-people">
      <SectionHead
        id="demo-people"
        title="People of the demo"
        about="Every person, organisation and project here is invented."
      />
      <table className="table table-stacked">
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">Role</th>
            <th scope="col">Organisation</th>
            <th scope="col">E-mail address and password</th>
            <th scope="col" className="number">
              <span className="hidden-text">Act</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {people.map((person) => (
            <tr key={person.email}>
              <th scope="row">{person.name}</th>
              <td>{person.roles.join(', ')}</td>
              <td>{person.organisation}</td>
              <td className="condensed mute">
                {person.email}, {person.password}
              </td>
              <td className="number">
                <Button
                  kind="text"
                  onPress={() => enter(person)}
                  isPending={entering === person.email}
                  aria-label={`Sign in as ${person.name}`}
                >
                  Sign in
                </Button>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
