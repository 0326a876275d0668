import { useState } from 'react';
import { Link } from 'react-router-dom';
import { requestPasswordReset } from '#shared/contracts/session';
import { Button } from '../../../components/ui/button';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { useAskForPasswordReset } from '../api/password-resets';

export function ForgottenPasswordPage() {
  usePageTitle('Ask for a new password');
  const askForPasswordReset = useAskForPasswordReset();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, problem, onSubmit } = useContractForm({
    schema: requestPasswordReset.body!,
    defaultValues: { email: '' },
    submit: async ({ email }) => {
      await askForPasswordReset(email);
      setSentTo(email);
    },
  });
  return (
    <PlainPage>
      <PageHead title="Ask for a new password" />
      {sentTo ? (
        <div role="status">
          <p className="prose">
            If {sentTo} has a sign-in, a mail with a link is on its way. The link works once and for a short
            time.
          </p>
          <p className="pt-3">
            <Link to={paths.signIn}>Back to sign-in</Link>
          </p>
        </div>
      ) : (
        <>
          {problem ? <ProblemNotice problem={problem} /> : null}
          <form onSubmit={onSubmit} noValidate className="form-column">
            <div className="fieldset">
              <FormText
                control={form.control}
                name="email"
                label="E-mail address"
                type="email"
                inputMode="email"
                autoComplete="username"
              />
            </div>
            <div className="acts pt-3">
              <Button kind="primary" type="submit" isPending={form.formState.isSubmitting}>
                Send the link
              </Button>
              <Link to={paths.signIn}>Back to sign-in</Link>
            </div>
          </form>
        </>
      )}
    </PlainPage>
  );
}
