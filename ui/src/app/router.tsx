import { createBrowserRouter, redirect, type RouteObject } from 'react-router-dom';
import { whenSignedOut } from '../shared/api/client';
import { LoadingFigure } from '../shared/feedback/loading';
import NotFound from '../routes/not-found';
import { Frame, frameLoader } from './frame';
import { lazyPage } from './lazy-page';
import { RouteError } from './route-error';
import { intakeRoutes } from './routes-intake';
import { opticsRoutes } from './routes-optics';
import { scienceRoutes } from './routes-science';

const pages: RouteObject[] = [
  { index: true, loader: () => redirect('/desk') },
  { path: 'desk', lazy: lazyPage(() => import('../routes/desk')) },
  ...intakeRoutes,
  ...scienceRoutes,
  ...opticsRoutes,
  { path: 'mailbox', lazy: lazyPage(() => import('../routes/mailbox')) },
  { path: 'ledger', lazy: lazyPage(() => import('../routes/ledger')) },
  { path: 'administration', lazy: lazyPage(() => import('../routes/administration')) },
  { path: 'profile', lazy: lazyPage(() => import('../routes/profile')) },
  { path: 'account', loader: () => redirect('/profile') }, // as mails call it
  { path: '*', element: <NotFound /> },
];

export const routes: RouteObject[] = [
  {
    errorElement: <RouteError />,
    hydrateFallbackElement: <LoadingFigure height={320} />,
    children: [
      { path: 'sign-in', lazy: lazyPage(() => import('../routes/sign-in')) },
      { path: 'first-administrator', lazy: lazyPage(() => import('../routes/first-administrator')) },
      { path: 'reset-password', lazy: lazyPage(() => import('../routes/reset-password')) },
      { path: 'accept-invitation', lazy: lazyPage(() => import('../routes/accept-invitation')) },
      {
        path: '/',
        loader: frameLoader,
        element: <Frame />,
        // A fault of one page leaves column and top bar standing.
        children: [{ errorElement: <RouteError />, children: pages }],
      },
    ],
  },
];

export function createRouter() {
  const router = createBrowserRouter(routes);
  whenSignedOut(() => {
    const { pathname, search } = router.state.location;
    if (pathname === '/sign-in') return;
    window.location.assign(`/sign-in?next=${encodeURIComponent(pathname + search)}`);
  });
  return router;
}
