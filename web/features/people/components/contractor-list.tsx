import { addContractor } from '#shared/contracts/organisation';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { FormText } from '../../../components/ui/form-fields';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { announce } from '../../../lib/announce';
import { useContractForm } from '../../../lib/form';
import { useContractors } from '../../../lib/queries/contractors-query';
import { useAddContractor } from '../api/add-contractor';

/** Contractors that work with the agency. */
export function ContractorList() {
  const { contractors, abilities } = useContractors();
  return (
    <section>
      <SectionHead title="Contractors" about="they submit mixes on the agency’s projects" />
      {contractors.length === 0 ? (
        <EmptyState title="No contractor works with the agency yet.">
          Add one; its administrator is invited by mail and invites its own people.
        </EmptyState>
      ) : (
        <table className="table table-stacked">
          <caption className="hidden-text">Contractors</caption>
          <thead>
            <tr>
              <th scope="col">Name</th>
              <th scope="col" className="number">
                Projects
              </th>
              <th scope="col">Administrator</th>
            </tr>
          </thead>
          <tbody>
            {contractors.map((contractor) => (
              <tr key={contractor.id}>
                <th scope="row">{contractor.name}</th>
                <td className="number">{contractor.projects}</td>
                <td>{administratorWords(contractor)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {abilities.add ? <AddContractor /> : null}
    </section>
  );
}

function administratorWords({ joined, invited }: { joined: boolean; invited: boolean }): string {
  if (joined) return 'signed up';
  return invited ? 'invited, not yet accepted' : 'not invited';
}

const empty = { name: '', administrator: { name: '', email: '' } };

function AddContractor() {
  const add = useAddContractor();
  const { form, problem, onSubmit } = useContractForm({
    schema: addContractor.body!,
    defaultValues: empty,
    submit: async (fields) => {
      const { name } = await add(fields);
      announce(`${name} is added; its administrator is invited by mail.`);
      form.reset(empty);
    },
  });
  const { control, formState } = form;
  return (
    <>
      <SectionHead title="Add a contractor" about="its administrator is invited by mail" />
      {problem ? <ProblemNotice problem={problem} unaffected="What you entered is kept." /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <div className="fieldset">
          <FormText control={control} name="name" label="Name of the contractor" />
          <FormText control={control} name="administrator.name" label="Administrator" />
          <FormText
            control={control}
            name="administrator.email"
            label="Administrator’s e-mail address"
            type="email"
            inputMode="email"
          />
        </div>
        <div className="acts pt-3">
          <Button type="submit" isPending={formState.isSubmitting}>
            Add the contractor
          </Button>
        </div>
      </form>
    </>
  );
}
