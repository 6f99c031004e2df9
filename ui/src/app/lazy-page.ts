import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import type { ActionFunction, LoaderFunction } from 'react-router-dom';
import { queryClient } from '../shared/api/query-client';
import { sessionQuery } from '../shared/api/session';

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
    loader: page.loader && onceSignedIn(page.loader(queryClient)),
    action: page.action?.(queryClient),
  };
};

/** Loaders of nested routes run side by side: without a person the frame leads away, and no data is asked for. */
const onceSignedIn =
  (loader: LoaderFunction): LoaderFunction =>
  async (args, context) => {
    const session = await queryClient.ensureQueryData(sessionQuery);
    return session.person ? loader(args, context) : null;
  };
