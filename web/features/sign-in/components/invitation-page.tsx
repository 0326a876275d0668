import { useNavigate } from 'react-router-dom';
import { acceptInvitation } from '#shared/contracts/people';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { Field } from '../../../components/ui/field';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { useAcceptInvitation, useInvitationLink } from '../api/invitation-link';

export function InvitationPage({ token }: { token: string }) {
  usePageTitle('Invitation');
  const invitation = useInvitationLink(token);
  const accept = useAcceptInvitation(token);
  const navigate = useNavigate();
  const { form, problem, onSubmit } = useContractForm({
    schema: acceptInvitation.body!,
    defaultValues: { name: invitation.name, password: '' },
    submit: async (given) => {
      await accept(given);
      await navigate(paths.home, { replace: true });
    },
  });
  return (
    <PlainPage>
      <PageHead
        title="Invitation"
        rest={invitation.organisation}
        lede={`You are invited as ${invitation.roles.join(' and ')}.`}
      />
      {problem ? <ProblemNotice problem={problem} /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <div className="fieldset">
          <Field label="E-mail address">{invitation.email}</Field>
          <FormText control={form.control} name="name" label="Your name" autoComplete="name" />
          <FormText
            control={form.control}
            name="password"
            label="Password"
            type="password"
            autoComplete={invitation.known ? 'current-password' : 'new-password'}
            help={
              invitation.known
                ? 'You have a sign-in already: enter its password.'
                : `At least ${limits.passwordMinimumCharacters} characters.`
            }
          />
        </div>
        <div className="acts pt-3">
          <Button kind="primary" type="submit" isPending={form.formState.isSubmitting}>
            Accept and sign in
          </Button>
        </div>
      </form>
    </PlainPage>
  );
}
