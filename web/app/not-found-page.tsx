import { Link } from 'react-router-dom';
import { PlainPage } from '../components/ui/margin-page';
import { PageHead } from '../components/ui/page-head';
import { paths } from '../lib/paths';
import { usePageTitle } from '../lib/use-page-title';

/** Says the same for what is not there and for what is not yours. */
export function NotFoundPage() {
  usePageTitle('Nothing is here');
  return (
    <PlainPage>
      <PageHead title="Nothing is here" />
      <p className="prose">
        The address leads to nothing that you may see. It may have been mistyped, or belong to an organisation
        other than the one you act for now. Search for it by its mix, project or clause, or{' '}
        <Link to={paths.home}>go to your first page</Link>.
      </p>
    </PlainPage>
  );
}
