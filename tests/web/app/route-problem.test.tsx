// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { RouteProblem } from '../../../web/app/route-problem';
import { Problem } from '../../../web/lib/problem';
import '../render-page';

const problem = (slug: string, status: number) =>
  new Problem({
    type: `/problems/${slug}`,
    title: 'The service is not ready',
    status,
    detail: 'It is starting.',
    fix: 'Try again in a few seconds.',
    requestId: 'r-7',
  });

function open(load: () => unknown) {
  const router = createMemoryRouter([
    {
      path: '/',
      element: <p>the page</p>,
      loader: async () => load() ?? null,
      hydrateFallbackElement: <p>loading</p>,
      errorElement: <RouteProblem />,
    },
  ]);
  render(<RouterProvider router={router} />);
}

describe('in place of a page', () => {
  it('says that nothing is here, the same for what is absent and what is not yours', async () => {
    open(() => {
      throw problem('not-found', 404);
    });
    expect((await screen.findByRole('heading', { level: 1 })).textContent).toBe('Nothing is here');
    expect(document.body.textContent).not.toContain('r-7');
  });

  it('names remedy and request, and tries again when asked', async () => {
    let failures = 1;
    open(() => {
      failures -= 1;
      if (failures >= 0) throw problem('not-ready', 503);
      return null;
    });
    const notice = await screen.findByRole('alert');
    expect(notice.textContent).toContain('Try again in a few seconds.');
    expect(notice.textContent).toContain('Request r-7');
    fireEvent.click(screen.getByText('Try again'));
    expect(await screen.findByText('the page')).toBeTruthy();
  });
});
