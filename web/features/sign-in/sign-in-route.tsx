import { queryClient } from '../../lib/client';
import { signInOptionsQuery } from './api/get-sign-in-options';
import { SignInPage } from './components/sign-in-page';

export async function loader() {
  await queryClient.ensureQueryData(signInOptionsQuery());
  return null;
}

export function Component() {
  return <SignInPage />;
}
