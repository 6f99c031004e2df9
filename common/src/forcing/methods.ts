import { efficiency } from './efficiency';
import type { ForcingMethod } from './method';
import { simpleAlbedo } from './simple-albedo';
import { thinLayer } from './thin-layer';
import { thinLayerDaily } from './thin-layer-daily';

/** Every method that computes forcing, by its id. */
export const FORCING_METHODS = {
  'thin-layer-daily': thinLayerDaily,
  'thin-layer': thinLayer,
  'simple-albedo': simpleAlbedo,
  efficiency,
} as const;

export type ForcingMethodId = keyof typeof FORCING_METHODS;

/** In the order in which a form offers them. */
export const FORCING_METHOD_LIST: readonly Omit<ForcingMethod<never>, 'evaluate'>[] =
  Object.values(FORCING_METHODS);
