import { type LoaderFunctionArgs, useLocation, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { WorkbookPage } from './components/workbook-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(revisionQuery(revisionOf(params)));
  return null;
}

export function Component() {
  const params = revisionOf(useParams());
  const { state } = useLocation();
  return (
    <WorkbookPage
      key={`${params.submittalId} ${params.number}`}
      params={params}
      justUploaded={state?.justUploaded === true}
    />
  );
}

function revisionOf(params: { submittalId?: string | undefined; number?: string | undefined }) {
  return { submittalId: params.submittalId ?? '', number: Number(params.number) };
}
