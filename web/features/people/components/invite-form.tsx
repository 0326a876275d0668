import { invitePerson } from '#shared/contracts/people';
import { rolesOf } from '#shared/contracts/roles';
import { Button } from '../../../components/ui/button';
import { FormCheckboxLine, FormText } from '../../../components/ui/form-fields';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { announce } from '../../../lib/announce';
import { useContractForm } from '../../../lib/form';
import { useSession } from '../../../lib/queries/session-query';
import { type InvitationFields, usePeopleActs } from '../api/people';

const empty: InvitationFields = { name: '', email: '', roles: [], contractorId: null };

export function InviteForm() {
  const { active } = useSession();
  const acts = usePeopleActs();
  const { form, problem, onSubmit } = useContractForm({
    schema: invitePerson.body!,
    defaultValues: empty,
    submit: async (fields) => {
      await acts.invite(fields);
      announce(`${fields.name} is invited by mail.`);
      form.reset(empty);
    },
  });
  const { control, formState } = form;
  return (
    <section>
      <SectionHead title="Invite a person" about="by mail, with a link that works once" />
      {problem ? <ProblemNotice problem={problem} unaffected="What you entered is kept." /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <div className="fieldset">
          <FormText control={control} name="name" label="Name" />
          <FormText control={control} name="email" label="E-mail address" type="email" inputMode="email" />
          <FormCheckboxLine
            control={control}
            name="roles"
            label="Roles"
            choices={rolesOf(active?.kind ?? 'contractor').map((role) => ({ value: role, label: role }))}
          />
        </div>
        <div className="acts pt-3">
          <Button type="submit" isPending={formState.isSubmitting}>
            Send the invitation
          </Button>
        </div>
      </form>
    </section>
  );
}
