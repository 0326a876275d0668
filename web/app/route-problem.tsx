import { useQueryErrorResetBoundary } from '@tanstack/react-query';
import { useRevalidator, useRouteError } from 'react-router-dom';
import { Button } from '../components/ui/button';
import { PlainPage } from '../components/ui/margin-page';
import { PageHead } from '../components/ui/page-head';
import { ProblemNotice } from '../components/ui/problem-notice';
import { asProblem, type Problem } from '../lib/problem';
import { usePageTitle } from '../lib/use-page-title';
import { NotFoundPage } from './not-found-page';

/** In place of a page that could not be opened; the running head stays. */
export function RouteProblem() {
  const problem = asProblem(useRouteError());
  if (problem.status === 404) return <NotFoundPage />;
  return <ProblemPage problem={problem} />;
}

/** Where not even the session could be asked for. */
export function ShellProblem() {
  return <ProblemPage problem={asProblem(useRouteError())} />;
}

function ProblemPage({ problem }: { problem: Problem }) {
  usePageTitle(problem.title);
  const { reset } = useQueryErrorResetBoundary();
  const { revalidate, state } = useRevalidator();
  return (
    <PlainPage>
      <PageHead title="This page could not be opened" />
      <ProblemNotice problem={problem}>
        <div className="acts pt-2">
          <Button
            isDisabled={state === 'loading'}
            onPress={() => {
              reset();
              void revalidate();
            }}
          >
            Try again
          </Button>
        </div>
      </ProblemNotice>
    </PlainPage>
  );
}
