import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { type DemoPerson, signIn } from '#shared/contracts/session';
import { paths } from '../../../app/paths';
import { Button } from '../../../components/ui/button';
import { FormTextField } from '../../../components/ui/form-text-field';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { asProblem, type Problem } from '../../../lib/problem';
import { useSignInOptions } from '../api/get-sign-in-options';
import { useSignIn } from '../api/sign-in';
import { safeReturnAddress } from '../lib/safe-return-address';
import { DemoPeople } from './demo-people';

export function SignInPage() {
  const { demoPeople, setUpNeeded } = useSignInOptions();
  const send = useSignInAndGoOn();
  const [demoProblem, setDemoProblem] = useState<Problem | null>(null);
  const { form, problem, onSubmit } = useContractForm({
    schema: signIn.body!,
    defaultValues: { email: '', password: '' },
    submit: send,
  });
  const enterAs = async ({ email, password }: DemoPerson) => {
    setDemoProblem(null);
    await send({ email, password }).catch((error) => setDemoProblem(asProblem(error)));
  };
  const shown = problem ?? demoProblem;
  return (
    <PlainPage>
      <PageHead title="Sign in" />
      {setUpNeeded ? (
        <p className="lede pb-3">
          No agency is set up yet. Open the set-up link that the server printed when it started.
        </p>
      ) : null}
      {shown ? <ProblemNotice problem={shown} /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <div className="fieldset">
          <FormTextField
            control={form.control}
            name="email"
            label="E-mail address"
            type="email"
            inputMode="email"
            autoComplete="username"
          />
          <FormTextField
            control={form.control}
            name="password"
            label="Password"
            type="password"
            autoComplete="current-password"
          />
        </div>
        <div className="acts pt-3">
          <Button kind="primary" type="submit" isPending={form.formState.isSubmitting}>
            Sign in
          </Button>
          <Link to={paths.forgotPassword}>Ask for a new password</Link>
        </div>
      </form>
      {demoPeople.length > 0 ? <DemoPeople people={demoPeople} onEnter={enterAs} /> : null}
    </PlainPage>
  );
}

function useSignInAndGoOn() {
  const signInWith = useSignIn();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  return async (given: { email: string; password: string }) => {
    const session = await signInWith(given);
    const wanted = safeReturnAddress(search.get('to')) ?? paths.home;
    await navigate(session.active ? wanted : paths.chooseOrganisation, { replace: true });
  };
}
