import { type Interval, intervalOf } from '../ensemble/interval';
import { FLUX, FLUXES, hasSky, type Sky } from './member-fluxes';
import type { PreparedEstimate } from './prepared-estimate';

interface Parts {
  /** null: no number belongs to this sky */
  shortwaveWm2: Interval | null;
  longwaveWm2: Interval | null;
  netWm2: Interval | null;
}

/** With this air minus without aerosol, in the slice or in the reference. */
export interface DirectEffect extends Parts {
  kind: 'direct-effect';
  of: 'slice' | 'reference';
  sky: Sky;
}

/** Direct effect of the slice minus that of the reference. Positive warms. */
export interface Forcing extends Parts {
  kind: 'forcing';
  sky: Sky;
}

/** All sky always has its three numbers. */
export type AllSky<T extends Parts> = T & { [K in keyof Parts]: Interval };

/** All sky has every part by construction (`hasSky`); this says so to the types. */
export function allSky<T extends Parts>(triple: T): AllSky<T> {
  const { shortwaveWm2, longwaveWm2, netWm2 } = triple;
  if (!shortwaveWm2 || !longwaveWm2 || !netWm2) throw new Error('an all-sky result lacks a part');
  return { ...triple, shortwaveWm2, longwaveWm2, netWm2 };
}

/** Fluxes of a region or of the globe: central case and members (eight numbers each), and its share of the sphere. */
export interface FluxSamples {
  central: Float64Array;
  members: Float64Array;
  areaShare: number;
}

export function forcingOf(prepared: PreparedEstimate, samples: FluxSamples, sky: Sky): Forcing {
  return { kind: 'forcing', sky, ...parts(prepared, samples, sky, 'difference') };
}

export function directEffectOf(
  prepared: PreparedEstimate,
  samples: FluxSamples,
  sky: Sky,
  of: 'slice' | 'reference',
): DirectEffect {
  return { kind: 'direct-effect', of, sky, ...parts(prepared, samples, sky, of) };
}

type State = 'slice' | 'reference' | 'difference';

function parts(prepared: PreparedEstimate, samples: FluxSamples, sky: Sky, state: State): Parts {
  const interval = (pick: (fluxes: Float64Array, at: number) => number): Interval =>
    intervalOf(pick(samples.central, 0) / samples.areaShare, valuesOf(samples, pick));
  const shortwave = picker(sky, 'shortwave', state);
  const longwave = picker(sky, 'longwave', state);
  const hasShortwave = hasSky(prepared, sky, 'shortwave');
  const hasLongwave = hasSky(prepared, sky, 'longwave');
  return {
    shortwaveWm2: hasShortwave ? interval(shortwave) : null,
    longwaveWm2: hasLongwave ? interval(longwave) : null,
    netWm2: hasShortwave && hasLongwave ? interval((f, at) => shortwave(f, at) + longwave(f, at)) : null,
  };
}

function picker(sky: Sky, part: 'shortwave' | 'longwave', state: State) {
  const { slice, reference } = FLUX[sky][part];
  if (state === 'slice') return (f: Float64Array, at: number) => f[at + slice]!;
  if (state === 'reference') return (f: Float64Array, at: number) => f[at + reference]!;
  return (f: Float64Array, at: number) => f[at + slice]! - f[at + reference]!;
}

function valuesOf(
  { members, areaShare }: FluxSamples,
  pick: (f: Float64Array, at: number) => number,
): Float64Array {
  const values = new Float64Array(members.length / FLUXES);
  for (let m = 0; m < values.length; m++) values[m] = pick(members, m * FLUXES) / areaShare;
  return values;
}

/** Net all-sky forcing of every member, ascending. */
export function netForcings(samples: FluxSamples): Float64Array {
  const shortwave = picker('all sky', 'shortwave', 'difference');
  const longwave = picker('all sky', 'longwave', 'difference');
  return valuesOf(samples, (f, at) => shortwave(f, at) + longwave(f, at)).sort();
}
