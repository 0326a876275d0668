import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, configure, render } from '@testing-library/react';
import { type ReactNode, Suspense, useState } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, onTestFinished, vi } from 'vitest';
import { FootPlace } from '../../web/components/ui/running-foot';
import { onAnnouncement } from '../../web/lib/announce';
import { createQueryClient } from '../../web/lib/query-client';
import { listenForShortcuts } from '../../web/lib/shortcuts';

// On a loaded machine the first drawing of a page takes longer than the second that is usual.
configure({ asyncUtilTimeout: 5000 });

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

export interface SentRequest {
  method: string;
  path: string;
  headers: Headers;
  body: unknown;
}

/** Answers by method and path: `'GET /api/session'`; what is asked for and not listed is a 404 problem. */
export function stubServer(answers: Record<string, unknown>): SentRequest[] {
  const sent: SentRequest[] = [];
  vi.stubGlobal('fetch', async (input: string, init?: RequestInit) => {
    const { pathname } = new URL(input, 'http://localhost');
    const method = init?.method ?? 'GET';
    const { body } = init ?? {};
    sent.push({
      method,
      path: input,
      headers: new Headers(init?.headers),
      body: typeof body === 'string' ? JSON.parse(body) : body,
    });
    const answer = answers[`${method} ${pathname}`];
    if (answer instanceof Response) return answer.clone();
    if (answer === undefined) return aProblemResponse('not-found', 404);
    return new Response(JSON.stringify(answer), { headers: { 'Content-Type': 'application/json' } });
  });
  return sent;
}

export function aProblemResponse(
  slug: string,
  status: number,
  extra: Record<string, unknown> = {},
): Response {
  const body = {
    type: `/problems/${slug}`,
    title: 'Nothing is here',
    status,
    detail: 'Nothing is here.',
    fix: 'Check the address.',
    requestId: 'r-1',
    ...extra,
  };
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'Content-Type': 'application/problem+json' },
  });
}

/** A page at its address, with the keys of the product listening. */
export function renderPage(element: ReactNode, { path, at }: { path: string; at: string }) {
  const client = createQueryClient({ onSignedOut: () => undefined });
  const router = createMemoryRouter(
    [
      { path, element },
      { path: '*', element: <p>elsewhere</p> },
    ],
    {
      initialEntries: [at],
    },
  );
  const stop = listenForShortcuts(document);
  const rendered = render(
    <QueryClientProvider client={client}>
      <Suspense fallback={<p>loading</p>}>
        <RouterProvider router={router} />
      </Suspense>
    </QueryClientProvider>,
  );
  return { ...rendered, router, client, stop };
}

/** A page with the place of its foot, as the shell gives it. */
export function WithFoot({ children }: { children: ReactNode }) {
  const [foot, setFoot] = useState<HTMLElement | null>(null);
  return (
    <FootPlace value={foot}>
      {children}
      <footer ref={setFoot} />
    </FootPlace>
  );
}

/** What is said to a screen reader from now on, in its order. */
export function listenToAnnouncements(): string[] {
  const said: string[] = [];
  onTestFinished(onAnnouncement((message) => said.push(message)));
  return said;
}
