import { type LoaderFunctionArgs, redirect, type ShouldRevalidateFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { paths } from '../../lib/paths';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams, useRevisionParams } from '../../lib/revision-params';
import { readingQuery } from './api/get-reading';
import { ReadingPage } from './components/reading-page';

/** A workbook that is still being read, or could not be, is shown on its own page. */
export async function loader({ params }: LoaderFunctionArgs) {
  const revision = readRevisionParams(params);
  const { job } = await queryClient.fetchQuery(revisionQuery(revision));
  if (job && job.state !== 'done') return redirect(paths.workbook(revision.submittalId, revision.number));
  await queryClient.ensureQueryData(readingQuery(revision));
  return null;
}

/** The address names the cell at the cursor; moving it asks the server for nothing new. */
export function shouldRevalidate({
  currentUrl,
  nextUrl,
  defaultShouldRevalidate,
}: ShouldRevalidateFunctionArgs) {
  return currentUrl.pathname === nextUrl.pathname ? false : defaultShouldRevalidate;
}

export function Component() {
  const params = useRevisionParams();
  return <ReadingPage key={`${params.submittalId} ${params.number}`} params={params} />;
}
