import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import type { ActionFunction, LoaderFunction } from 'react-router-dom';
import { queryClient } from '../shared/api/query-client';

type PageModule = {
  default: ComponentType;
  loader?: (client: QueryClient) => LoaderFunction;
  action?: (client: QueryClient) => ActionFunction;
};

/** A route whose code comes when it is opened: `{ path: 'ledger', lazy: lazyPage(() => import('../routes/ledger')) }`. */
export const lazyPage = (load: () => Promise<PageModule>) => async () => {
  const page = await load();
  return {
    Component: page.default,
    loader: page.loader?.(queryClient),
    action: page.action?.(queryClient),
  };
};
