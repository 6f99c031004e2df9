import type { LayerScheme } from './layer-scheme';
import { solverByAngles } from './solver-by-angles';
import { CLOSURES, twoStreamLayer, type ClosureId } from './two-stream-closures';

/** The layer scheme of a two-stream closure; isotropic light as the mean of the closure over sun angles. */
export function twoStreamScheme(closure: ClosureId): LayerScheme {
  return {
    title: `Two-stream, ${CLOSURES[closure].title}`,
    source:
      'Meador & Weaver (1980), J. Atmos. Sci. 37, 630–643; delta scaling by Joseph, Wiscombe & Weinman (1976), J. Atmos. Sci. 33, 2452–2459',
    prepare: (asymmetry, cosSolarZeniths) =>
      solverByAngles(
        cosSolarZeniths,
        (mu) => (opticalDepth, singleScatteringAlbedo) =>
          twoStreamLayer(closure, opticalDepth, singleScatteringAlbedo, asymmetry, mu),
      ),
  };
}
