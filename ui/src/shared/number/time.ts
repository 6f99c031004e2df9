const dateStyle: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'short', year: 'numeric' };

export const formatDate = (iso: string) => new Intl.DateTimeFormat('en-GB', dateStyle).format(new Date(iso));

export const formatDateTime = (iso: string) =>
  new Intl.DateTimeFormat('en-GB', { ...dateStyle, hour: '2-digit', minute: '2-digit' }).format(
    new Date(iso),
  );

const steps: [limitSeconds: number, unitSeconds: number, name: string][] = [
  [90, 1, 's'],
  [5400, 60, 'min'],
  [129_600, 3600, 'h'],
];

/** A length of time in the largest unit that still says enough: 45 s, 12 min, 26 h, 9 days. */
export function formatDuration(seconds: number): string {
  for (const [limit, unit, name] of steps) {
    if (seconds < limit) return `${Math.max(0, Math.round(seconds / unit))} ${name}`;
  }
  return `${Math.round(seconds / 86_400)} days`;
}

export function formatAgo(iso: string, now = Date.now()): string {
  const seconds = (now - Date.parse(iso)) / 1000;
  return seconds < 60 ? 'just now' : `${formatDuration(seconds)} ago`;
}

export const formatWaits = (iso: string, now = Date.now()) => formatDuration((now - Date.parse(iso)) / 1000);
