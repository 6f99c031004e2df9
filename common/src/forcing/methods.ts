import { efficiency } from './efficiency';
import type { ForcingMethod } from './method';
import { multiStream } from './multi-stream';
import { simpleAlbedo } from './simple-albedo';
import { slantedLayer } from './slanted-layer';
import { thinLayer } from './thin-layer';
import { thinLayerDaily } from './thin-layer-daily';
import { twoStream } from './two-stream';

/** Every method that computes forcing, by its id. */
export const FORCING_METHODS = {
  'slanted-layer': slantedLayer,
  'two-stream': twoStream,
  'multi-stream': multiStream,
  'thin-layer-daily': thinLayerDaily,
  'thin-layer': thinLayer,
  'simple-albedo': simpleAlbedo,
  efficiency,
} as const;

export type ForcingMethodId = keyof typeof FORCING_METHODS;

/** In the order in which a form offers them. */
export const FORCING_METHOD_LIST: readonly Omit<ForcingMethod<never>, 'evaluate'>[] =
  Object.values(FORCING_METHODS);
