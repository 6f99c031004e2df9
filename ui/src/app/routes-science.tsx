import type { RouteObject } from 'react-router-dom';
import { lazyPage } from './lazy-page';

/** Addresses of Slices, Estimates, Exports and the trace of a number. */
export const scienceRoutes: RouteObject[] = [
  { path: 'slices', lazy: lazyPage(() => import('../routes/slices')) },
  { path: 'slices/:slug', lazy: lazyPage(() => import('../routes/slice')) },
  { path: 'slices/:slug/new-field', lazy: lazyPage(() => import('../routes/slice-new-field')) },
  { path: 'fields/:versionId', lazy: lazyPage(() => import('../routes/field')) },
  { path: 'fields/:versionId/trace', lazy: lazyPage(() => import('../routes/field-trace')) },
  { path: 'estimates', lazy: lazyPage(() => import('../routes/estimates')) },
  { path: 'estimates/new', lazy: lazyPage(() => import('../routes/estimates-new')) },
  { path: 'estimates/:id', lazy: lazyPage(() => import('../routes/estimate')) },
  { path: 'exports', lazy: lazyPage(() => import('../routes/exports')) },
];
