/** Where to go after sign-in: only an address inside this client, never another host. */
export function localPath(wanted: string | null): string {
  if (!wanted || !wanted.startsWith('/') || /^\/[/\\]/.test(wanted)) return '/desk';
  const address = new URL(wanted, window.location.origin);
  return address.origin === window.location.origin
    ? address.pathname + address.search + address.hash
    : '/desk';
}
