import { useState } from 'react';
import { Link } from 'react-router-dom';
import { resetPassword } from '#shared/contracts/session';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { setNewPassword } from '../api/password-resets';

export function NewPasswordPage({ token }: { token: string }) {
  usePageTitle('Set a new password');
  const [isSet, setIsSet] = useState(false);
  const { form, problem, onSubmit } = useContractForm({
    schema: resetPassword.body!,
    defaultValues: { password: '' },
    submit: async ({ password }) => {
      await setNewPassword(token, password);
      setIsSet(true);
    },
  });
  return (
    <PlainPage>
      <PageHead title="Set a new password" />
      {isSet ? (
        <p role="status">
          The new password is set, and every session that was open has ended.{' '}
          <Link to={paths.signIn}>Sign in</Link>
        </p>
      ) : (
        <>
          {problem ? (
            <ProblemNotice problem={problem}>
              <Link to={paths.forgotPassword}>Ask for a new link</Link>
            </ProblemNotice>
          ) : null}
          <form onSubmit={onSubmit} noValidate className="form-column">
            <div className="fieldset">
              <FormText
                control={form.control}
                name="password"
                label="New password"
                type="password"
                autoComplete="new-password"
                help={`At least ${limits.passwordMinimumCharacters} characters.`}
              />
            </div>
            <div className="acts pt-3">
              <Button kind="primary" type="submit" isPending={form.formState.isSubmitting}>
                Set the password
              </Button>
            </div>
          </form>
        </>
      )}
    </PlainPage>
  );
}
