import { useParams } from 'react-router-dom';
import { NewPasswordPage } from './components/new-password-page';

export function Component() {
  const { token = '' } = useParams();
  return <NewPasswordPage token={token} />;
}
