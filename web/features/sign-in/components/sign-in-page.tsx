import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { type DemoPerson, signIn } from '#shared/contracts/session';
import { Button } from '../../../components/ui/button';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { asProblem, type Problem } from '../../../lib/problem';
import { usePageTitle } from '../../../lib/use-page-title';
import { useSignInOptions } from '../api/get-sign-in-options';
import { useSignIn } from '../api/sign-in';
import { safeReturnAddress } from '../lib/safe-return-address';
import { DemoPeople } from './demo-people';

export function SignInPage() {
  usePageTitle('Sign in');
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
          <FormText
            control={form.control}
            name="email"
            label="E-mail address"
            type="email"
            inputMode="email"
            autoComplete="username"
          />
          <FormText
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
    const wanted = safeReturnAddress(search.get('next')) ?? paths.home;
    await navigate(session.active ? wanted : paths.chooseOrganisation, { replace: true });
  };
}
