import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { ruleSetQuery } from './api/get-rule-set';

export { RuleSetPage as Component } from './components/rule-set-page';

export async function loader({ params, request }: LoaderFunctionArgs) {
  const layers = new URL(request.url).searchParams.get('layers') ?? '';
  await queryClient.ensureQueryData(
    ruleSetQuery({ ruleSetId: params.ruleSetId ?? '', edition: params.edition ?? '', layers }),
  );
  return null;
}
