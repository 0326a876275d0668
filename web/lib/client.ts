import { paths } from './paths';
import { createQueryClient } from './query-client';

/** One cache for the page. A session that ended elsewhere leads to the sign-in page and back again. */
export const queryClient = createQueryClient({
  onSignedOut: () => {
    const { pathname, search, hash } = window.location;
    if (isOpenPage(pathname)) return;
    window.location.assign(`${paths.signIn}?next=${encodeURIComponent(pathname + search + hash)}`);
  },
});

const openPages = [
  '/sign-in',
  '/set-up/',
  '/invitations/',
  '/forgotten-password',
  '/new-password/',
  '/caught-mail',
];

function isOpenPage(pathname: string): boolean {
  return openPages.some((page) => pathname.startsWith(page));
}
