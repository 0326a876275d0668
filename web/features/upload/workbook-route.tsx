import { type LoaderFunctionArgs, useLocation } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams, useRevisionParams } from '../../lib/revision-params';
import { WorkbookPage } from './components/workbook-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(revisionQuery(readRevisionParams(params)));
  return null;
}

export function Component() {
  const params = useRevisionParams();
  const { state } = useLocation();
  return (
    <WorkbookPage
      key={`${params.submittalId} ${params.number}`}
      params={params}
      justUploaded={state?.justUploaded === true}
    />
  );
}
