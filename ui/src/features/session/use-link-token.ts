import { useEffect, useState } from 'react';

/** The token of a mailed link, from its fragment or query; it is taken out of the address at once. */
export function useLinkToken(): string {
  const [token] = useState(() => tokenOf(window.location));
  useEffect(() => {
    if (tokenOf(window.location))
      window.history.replaceState(window.history.state, '', window.location.pathname);
  }, []);
  return token;
}

export function tokenOf({ hash, search }: Pick<Location, 'hash' | 'search'>): string {
  const fragment = hash.replace(/^#/, '');
  return new URLSearchParams(fragment).get('token') ?? new URLSearchParams(search).get('token') ?? fragment;
}
