import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { NotFoundPage } from './not-found-page';
import { OpenLayout } from './open-layout';
import { PageLoading, RootLayout } from './root-layout';
import { RouteProblem, ShellProblem } from './route-problem';

/**
 * One line a page. Each module is its own chunk and gives `Component` and, where it needs data, a `loader` that warms
 * the same queries the component reads.
 */
const signedIn: RouteObject[] = [
  { index: true, lazy: () => import('../features/home/home-route') },
  { path: 'organisations', lazy: () => import('../features/sign-in/choose-organisation-route') },
  { path: 'queue', lazy: () => import('../features/queue/queue-route') },
  { path: 'submittals', lazy: () => import('../features/submittals/submittals-route') },
  { path: 'submittals/new', lazy: () => import('../features/upload/upload-route') },
  { path: 'submittals/:submittalId/next', lazy: () => import('../features/upload/next-revision-route') },
  {
    path: 'submittals/:submittalId/r/:number/workbook',
    lazy: () => import('../features/upload/workbook-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/reading',
    lazy: () => import('../features/reading/reading-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number',
    lazy: () => import('../features/findings/findings-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/checks',
    lazy: () => import('../features/checks/checks-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/checks/:check',
    lazy: () => import('../features/checks/kept-check-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/gradation',
    lazy: () => import('../features/gradation/gradation-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/creep',
    lazy: () => import('../features/creep/creep-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/room',
    lazy: () => import('../features/room/room-route'),
  },
  {
    path: 'submittals/:submittalId/r/:number/return',
    lazy: () => import('../features/return/return-route'),
  },
  { path: 'projects', lazy: () => import('../features/projects/projects-route') },
  { path: 'projects/new', lazy: () => import('../features/projects/new-project-route') },
  { path: 'projects/:projectId', lazy: () => import('../features/projects/project-route') },
  { path: 'projects/:projectId/change', lazy: () => import('../features/projects/change-project-route') },
  { path: 'people', lazy: () => import('../features/people/people-route') },
  { path: 'settings', lazy: () => import('../features/settings/settings-route') },
  { path: 'laboratories', lazy: () => import('../features/settings/laboratories-route') },
  { path: 'mappings', lazy: () => import('../features/mappings/mappings-route') },
  { path: 'mappings/:mappingId', lazy: () => import('../features/mappings/mapping-route') },
  { path: 'quantities', lazy: () => import('../features/quantities/quantities-route') },
  { path: 'rule-sets', lazy: () => import('../features/rule-sets/rule-sets-route') },
  { path: 'rule-sets/new-draft', lazy: () => import('../features/drafts/new-draft-route') },
  {
    path: 'rule-sets/:ruleSetId/drafts/:draftId',
    lazy: () => import('../features/drafts/draft-layout-route'),
    children: [
      { index: true, lazy: () => import('../features/drafts/draft-route') },
      { path: 'rules/:ruleId', lazy: () => import('../features/drafts/rule-route') },
      { path: 'tables/:tableId', lazy: () => import('../features/drafts/table-route') },
    ],
  },
  {
    path: 'rule-sets/:ruleSetId/:edition/compare',
    lazy: () => import('../features/compare/compare-route'),
  },
  { path: 'rule-sets/:ruleSetId/:edition', lazy: () => import('../features/rule-sets/rule-set-route') },
];

/** Pages without a session: signing in, links from mails. */
const open: RouteObject[] = [
  { path: 'sign-in', lazy: () => import('../features/sign-in/sign-in-route') },
  { path: 'forgotten-password', lazy: () => import('../features/sign-in/forgotten-password-route') },
  { path: 'new-password/:token', lazy: () => import('../features/sign-in/new-password-route') },
  { path: 'invitations/:token', lazy: () => import('../features/sign-in/invitation-route') },
  { path: 'set-up/:token', lazy: () => import('../features/set-up/set-up-route') },
];

/** Mail caught on loopback: read by people who are invited and have no sign-in yet, too. */
const either: RouteObject[] = [
  { path: 'caught-mail', lazy: () => import('../features/caught-mail/caught-mail-route') },
  { path: 'caught-mail/:mailId', lazy: () => import('../features/caught-mail/caught-mail-route') },
];

export function createRouter() {
  return createBrowserRouter([
    {
      element: <RootLayout />,
      hydrateFallbackElement: <PageLoading />,
      errorElement: <ShellProblem />,
      children: [
        { element: <OpenLayout />, children: [{ errorElement: <RouteProblem />, children: open }] },
        {
          lazy: () => import('./either-layout'),
          errorElement: <ShellProblem />,
          children: [{ errorElement: <RouteProblem />, children: either }],
        },
        {
          lazy: () => import('./signed-in-layout'),
          errorElement: <ShellProblem />,
          children: [
            {
              errorElement: <RouteProblem />,
              children: [...signedIn, { path: '*', element: <NotFoundPage /> }],
            },
          ],
        },
      ],
    },
  ]);
}
