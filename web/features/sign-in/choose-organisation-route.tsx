import { ChooseOrganisationPage } from './components/choose-organisation-page';

export function Component() {
  return <ChooseOrganisationPage />;
}
