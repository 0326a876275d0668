import { Link } from 'react-router-dom';
import { addLaboratory } from '#shared/contracts/people';
import { formatDate } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { announce } from '../../../lib/announce';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { useLaboratories } from '../../../lib/queries/laboratories-query';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useAddLaboratory } from '../api/add-laboratory';

/** Whoever made the tests: a revision names one, and the way its workbooks are read is kept with it. */
export function LaboratoriesPage() {
  usePageTitle('Laboratories');
  const { active } = useSession();
  const { laboratories, abilities } = useLaboratories();
  return (
    <PlainPage>
      <PageHead title="Laboratories" rest={active?.organisationName} />
      {laboratories.length === 0 ? (
        <EmptyState title="No laboratory is named yet.">
          A revision names the laboratory that made the design.
          {abilities.add ? ' Add the first below.' : ' An administrator adds it.'}
        </EmptyState>
      ) : (
        <table className="table table-head-over table-stacked">
          <caption className="hidden-text">Laboratories</caption>
          <thead>
            <tr>
              <th scope="col">Name</th>
              <th scope="col">Accreditation</th>
              <th scope="col" className="number">
                Mappings
              </th>
              <th scope="col">Since</th>
            </tr>
          </thead>
          <tbody>
            {laboratories.map((laboratory) => (
              <tr key={laboratory.id}>
                <th scope="row">{laboratory.name}</th>
                <td>{laboratory.accreditation ?? <span className="mute">none stated</span>}</td>
                <td className="number">
                  {laboratory.mappings === 0 ? '·' : <Link to={paths.mappings}>{laboratory.mappings}</Link>}
                </td>
                <td>{formatDate(laboratory.since)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {abilities.add ? <AddLaboratory /> : null}
    </PlainPage>
  );
}

const empty = { name: '', accreditation: '' };

function AddLaboratory() {
  const add = useAddLaboratory();
  const { form, problem, onSubmit } = useContractForm({
    schema: addLaboratory.body!,
    defaultValues: empty,
    submit: async (fields) => {
      const { name } = await add({ ...fields, accreditation: fields.accreditation || null });
      announce(`${name} is added.`);
      form.reset(empty);
    },
  });
  const { control, formState } = form;
  return (
    <section>
      <SectionHead title="Add a laboratory" />
      {problem ? <ProblemNotice problem={problem} unaffected="What you entered is kept." /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <div className="fieldset">
          <FormText control={control} name="name" label="Name" />
          <FormText
            control={control}
            name="accreditation"
            label="Accreditation"
            help="number and body; may stay empty"
          />
        </div>
        <div className="acts pt-3">
          <Button type="submit" isPending={formState.isSubmitting}>
            Add the laboratory
          </Button>
        </div>
      </form>
    </section>
  );
}
