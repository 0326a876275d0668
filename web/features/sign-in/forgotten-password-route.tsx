import { ForgottenPasswordPage } from './components/forgotten-password-page';

export function Component() {
  return <ForgottenPasswordPage />;
}
