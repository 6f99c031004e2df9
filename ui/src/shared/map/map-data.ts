import type { RampName } from '../theme/ramps';
import type { ProjectionName } from './projections';
import type { RasterField } from './raster';

export type MapRegion = {
  code: string;
  name: string;
  parts: readonly (readonly (readonly [number, number])[])[];
};
export type MapSite = { longitudeDeg: number; latitudeDeg: number; sampleCount: number; name?: string };

/** What a map shows; picked and pointed-at regions are shared with the table beside it. */
export type MapData = {
  regions: readonly MapRegion[];
  /** Value by region code; regions without one stay blank. */
  values?: Readonly<Record<string, number | null>>;
  /** Drawn instead of the region fill where given. */
  field?: RasterField;
  ramp?: RampName;
  /** Upper end of the colours; forcing runs from −limit to +limit. */
  limit: number;
  /** Lower end of the logarithmic ramps. */
  floor?: number;
  hatched?: ReadonlySet<string>;
  sites?: readonly MapSite[];
  selected?: string | null;
  hovered?: string | null;
  projection?: ProjectionName;
};
