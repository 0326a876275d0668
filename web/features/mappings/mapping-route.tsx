import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { mappingQuery } from './api/mappings';
import { MappingPage } from './components/mapping-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(mappingQuery(params.mappingId ?? ''));
  return null;
}

export function Component() {
  const { mappingId = '' } = useParams();
  return <MappingPage key={mappingId} mappingId={mappingId} />;
}
