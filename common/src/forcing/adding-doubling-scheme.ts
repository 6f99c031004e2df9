import { doublingSolver } from './adding-doubling';
import type { LayerScheme } from './layer-scheme';
import { scatteringAngles } from './scattering-angles';

/** Streams per hemisphere on offer, and the forward peak left over that they must bring down. */
const STREAMS = [16, 24, 32, 48, 64, 96] as const;
const FORWARD_PEAK = 1e-4;

/** |g| up to which the streams on offer keep the stated error. */
export const MAX_RESOLVED_ASYMMETRY = FORWARD_PEAK ** (1 / (2 * STREAMS[STREAMS.length - 1]!));

/** Streams per hemisphere that a Henyey–Greenstein layer of asymmetry g needs: |g|^2N at most 1e-4, or all there are. */
export function streamsFor(asymmetry: number): number {
  const fits = (streams: number) => Math.abs(asymmetry) ** (2 * streams) <= FORWARD_PEAK;
  return STREAMS.find(fits) ?? STREAMS[STREAMS.length - 1]!;
}

/** χ_l = g^l, l = 0 to 2N. */
export function henyeyGreensteinMoments(asymmetry: number, streams: number): Float64Array {
  return Float64Array.from({ length: 2 * streams + 1 }, (_, l) => asymmetry ** l);
}

/** All orders of scattering, the Henyey–Greenstein phase function. */
export const addingDoubling: LayerScheme = {
  title: 'Multi-stream (adding–doubling)',
  source:
    'Adding–doubling after van de Hulst (1980), Multiple Light Scattering, and Grant & Hunt (1969), Proc. R. Soc. A 313, 183–197; forward peak cut after Wiscombe (1977), J. Atmos. Sci. 34, 1408–1422',
  prepare: (asymmetry, cosSolarZeniths) =>
    doublingSolver(
      scatteringAngles(henyeyGreensteinMoments(asymmetry, streamsFor(asymmetry)), cosSolarZeniths),
    ),
};
