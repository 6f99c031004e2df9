import { efficiency } from '@siltlight/common/forcing/efficiency';
import { simpleAlbedo } from '@siltlight/common/forcing/simple-albedo';
import { thinLayer } from '@siltlight/common/forcing/thin-layer';
import { thinLayerDaily } from '@siltlight/common/forcing/thin-layer-daily';
import type { EstimateMethodId } from '@siltlight/common/wire/estimates';

type Told = { title: string; formula: string; source: string };

/** Title, formula and source of the methods an estimate may use; the other methods of the list stay out of the bundle. */
export const methodFormulas: Record<EstimateMethodId, Told> = {
  'thin-layer-daily': thinLayerDaily,
  'thin-layer': thinLayer,
  'simple-albedo': simpleAlbedo,
  efficiency,
};
