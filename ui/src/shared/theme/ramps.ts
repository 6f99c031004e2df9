import type { ColourMode } from './tokens';

export type RampName = 'forcing' | 'flux' | 'depth';

const forcingLight =
  '#0F3B66 #2B659B #5F97C4 #A3C6DF #D9E6EC #F6F3EC #F3DACB #E5AA90 #CC6F57 #A63C31 #701A1D'.split(' ');
// Dark in the middle, so that zero recedes and the map does not glare.
const forcingDark =
  '#8CC6F2 #5C9FD6 #3A76AE #2A5380 #253B52 #26292D #4A2F2B #7C3A30 #B0503F #DA7A5F #F5AD8F'.split(' ');
const flux = '#F5F0E1 #E9D7AC #D9B976 #C29647 #A37430 #7F5424 #5B381B #3A2212'.split(' ');
const depth = '#EEF4F6 #CFE0E6 #A9C8D3 #7FADBD #578FA3 #3A7085 #265266 #173647'.split(' ');

export const ramps: Record<RampName, Record<ColourMode, readonly string[]>> = {
  forcing: { light: forcingLight, dark: forcingDark },
  flux: { light: flux, dark: [...flux].reverse() },
  depth: { light: depth, dark: [...depth].reverse() },
};

/** Colours of the series in a chart, in the order in which they are given out. */
export const seriesColours: Record<ColourMode, readonly string[]> = {
  light: ['#22384A', '#B27A2B', '#3F7F95', '#9A3F23', '#4C6B3C', '#7A6A8E'],
  dark: ['#B8CDDA', '#D9A75A', '#63AEC4', '#D9775A', '#8DB17A', '#B0A0C6'],
};

export function rgbOf(hex: string): [number, number, number] {
  return [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16)) as [number, number, number];
}

/** Colour at a place 0 to 1 along a ramp, as [r, g, b]; places outside take the end's colour. */
export function mix(ramp: readonly string[], place: number): [number, number, number] {
  const x = Math.min(1, Math.max(0, place)) * (ramp.length - 1);
  const step = Math.min(ramp.length - 2, Math.floor(x));
  const from = rgbOf(ramp[step]!);
  const to = rgbOf(ramp[step + 1]!);
  return from.map((v, i) => Math.round(v + (to[i]! - v) * (x - step))) as [number, number, number];
}

/** Place of a value on its ramp: forcing is linear and symmetric, flux and depth follow the logarithm. */
export function placeOnRamp(name: RampName, value: number, limit: number, floor: number): number {
  if (name === 'forcing') return 0.5 + value / (2 * limit);
  if (value <= floor) return 0;
  return Math.log(value / floor) / Math.log(limit / floor);
}

export const css = (rgb: readonly number[]) => `rgb(${rgb.join(',')})`;

/** Fill of a forcing value [W m⁻²] under limits of plus and minus `limitWm2`. */
export const forcingColour = (netWm2: number, limitWm2: number, mode: ColourMode) =>
  css(mix(ramps.forcing[mode], placeOnRamp('forcing', netWm2, limitWm2, 0)));

export const gradient = (ramp: readonly string[]) => `linear-gradient(90deg, ${ramp.join(', ')})`;
