import type { RouteObject } from 'react-router-dom';
import { lazyPage } from './lazy-page';

/** Addresses of Intake and Holdings. */
export const intakeRoutes: RouteObject[] = [
  // One page in both: the list stays where it is while the upload dialog comes and goes.
  {
    lazy: lazyPage(() => import('../routes/intake')),
    children: [{ path: 'intake' }, { path: 'intake/new' }],
  },
  { path: 'intake/rules', lazy: lazyPage(() => import('../routes/intake-rules')) },
  { path: 'intake/:id', lazy: lazyPage(() => import('../routes/intake-bench')) },
  { path: 'holdings', lazy: lazyPage(() => import('../routes/holdings')) },
  { path: 'holdings/:slug', lazy: lazyPage(() => import('../routes/holdings-dataset')) },
  { path: 'holdings/:slug/versions/:number', lazy: lazyPage(() => import('../routes/holdings-dataset')) },
  { path: 'holdings/:slug/versions/:number/cells', lazy: lazyPage(() => import('../routes/holdings-cells')) },
];
