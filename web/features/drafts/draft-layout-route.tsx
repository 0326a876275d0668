import type { LoaderFunctionArgs } from 'react-router-dom';
import { loadDraftPage } from './api/load-draft-page';

export { DraftLayout as Component } from './components/draft-layout';

export async function loader({ params }: LoaderFunctionArgs) {
  await loadDraftPage(params.draftId ?? '');
  return null;
}
