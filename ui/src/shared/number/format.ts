const MINUS = '\u2212';

type Style = { decimals?: number; figures?: number; signed?: boolean };

/** A number for the screen: true minus sign, no digit grouping (the Digits component shows the gaps). */
export function formatNumber(value: number, { decimals, figures, signed = false }: Style = {}): string {
  const places = decimals ?? decimalsForFigures(value, figures ?? 3);
  const text = Math.abs(value).toFixed(places);
  const isZero = Number(text) === 0;
  if (value < 0 && !isZero) return MINUS + text;
  return signed && !isZero ? `+${text}` : text;
}

/** A forcing [W m⁻²], always with its sign. */
export const formatForcing = (netWm2: number, decimals = 2) =>
  formatNumber(netWm2, { decimals, signed: true });

/** Decimals that keep a count of significant figures, 0 to 8. */
export function decimalsForFigures(value: number, figures: number): number {
  if (value === 0) return 0;
  return clamp(figures - 1 - Math.floor(Math.log10(Math.abs(value))), 0, 8);
}

/** Decimals that an interval supports: two figures of its width, no more. */
export function decimalsForInterval(low: number, high: number, fallback = 2): number {
  const width = Math.abs(high - low);
  return width > 0 ? clamp(1 - Math.floor(Math.log10(width)), 0, 6) : fallback;
}

/** Very large or small values as mantissa and exponent, so that a column keeps its width. */
export function scientificParts(value: number, figures = 3): { mantissa: string; exponent: number } | null {
  const size = Math.abs(value);
  if (size === 0 || (size >= 1e-3 && size < 1e6)) return null;
  const exponent = Math.floor(Math.log10(size));
  return { mantissa: formatNumber(value / 10 ** exponent, { decimals: figures - 1 }), exponent };
}

/** Groups of three digits before the decimal point. */
export function digitGroups(text: string): string[] {
  const [whole = '', fraction] = text.split('.');
  const sign = /^[+\u2212]/.exec(whole)?.[0] ?? '';
  const digits = whole.slice(sign.length);
  const groups = digits.length > 4 ? digits.split(/(?=(?:\d{3})+$)/) : [digits];
  groups[0] = sign + groups[0];
  if (fraction !== undefined) groups[groups.length - 1] += `.${fraction}`;
  return groups;
}

/** An age [ka before 1950] without needless zeros. */
export function formatAge(ageKa: number): string {
  return formatNumber(Number(ageKa.toFixed(ageKa < 1 ? 3 : 2)), { decimals: decimalsShown(ageKa) });
}

function decimalsShown(value: number): number {
  const text = String(Number(value.toFixed(value < 1 ? 3 : 2)));
  return text.includes('.') ? text.split('.')[1]!.length : 0;
}

/** An evidence window; from a million years on it is told in Ma. */
export function formatAgeSpan(youngKa: number, oldKa: number): string {
  if (youngKa >= 1000) return `${formatAge(oldKa / 1000)} to ${formatAge(youngKa / 1000)} Ma`;
  return `${formatAge(oldKa)} to ${formatAge(youngKa)} ka`;
}

export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  const step = Math.min(3, Math.floor(Math.log10(bytes) / 3));
  return `${formatNumber(bytes / 1000 ** step, { figures: 3 })} ${['B', 'kB', 'MB', 'GB'][step]}`;
}

export const formatPercent = (share01: number, decimals = 0) =>
  `${formatNumber(share01 * 100, { decimals })} %`;

/** "1 site", "3 sites". */
export const counted = (count: number, one: string, many = `${one}s`) =>
  `${count} ${count === 1 ? one : many}`;

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));
