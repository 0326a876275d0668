import { Suspense, useState } from 'react';
import { RouterProvider as AriaRouter } from 'react-aria-components';
import { Outlet, ScrollRestoration, useHref, useNavigate } from 'react-router-dom';
import { LoadingBars } from '../components/ui/loading-bars';
import { FootPlace } from '../components/ui/running-foot';

/** What every page has, signed in or not: client navigation for menus, the place of the foot, scroll kept. */
export function RootLayout() {
  const navigate = useNavigate();
  const [foot, setFoot] = useState<HTMLElement | null>(null);
  return (
    <AriaRouter navigate={(href) => void navigate(href)} useHref={useHref}>
      <FootPlace value={foot}>
        <Suspense fallback={<PageLoading />}>
          <Outlet />
        </Suspense>
        <footer ref={setFoot} />
      </FootPlace>
      <ScrollRestoration />
    </AriaRouter>
  );
}

export function PageLoading() {
  return (
    <main id="content" className="page">
      <LoadingBars
        what="Opening the page."
        rows={6}
        whenLong="The server is slow to answer; the page opens as soon as it does."
      />
    </main>
  );
}
