import type { RouteObject } from 'react-router-dom';
import { lazyPage } from './lazy-page';

/** Addresses of Optics. */
export const opticsRoutes: RouteObject[] = [
  { path: 'optics', lazy: lazyPage(() => import('../routes/optics')) },
  { path: 'optics/new', lazy: lazyPage(() => import('../routes/optics-new')) },
  { path: 'optics/:slug', lazy: lazyPage(() => import('../routes/optics-set')) },
];
