import { useState } from 'react';
import { Link } from 'react-router-dom';
import { resetPassword } from '#shared/contracts/session';
import { limits } from '#shared/limits';
import { paths } from '../../../app/paths';
import { Button } from '../../../components/ui/button';
import { FormTextField } from '../../../components/ui/form-text-field';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { setNewPassword } from '../api/password-resets';

export function NewPasswordPage({ token }: { token: string }) {
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
              <FormTextField
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
