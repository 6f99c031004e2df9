import { lazy, Suspense, useMemo, useState } from 'react';
import { LoadingFigure } from '../feedback/loading';
import { formatForcing, formatNumber } from '../number/format';
import { useColourMode } from '../theme/colour-mode';
import type { MapData } from './map-data';
import { MapLegend } from './map-legend';
import './map.css';

const MapCanvas = lazy(() => import('./map-canvas'));

type Props = MapData & {
  /** What the map shows, in words: its accessible name. The table beside it holds the numbers and the keyboard. */
  label: string;
  unit?: string;
  hatchMeans?: string;
  onSelect?: (code: string | null) => void;
  onHover?: (code: string | null) => void;
};

const noHatch: ReadonlySet<string> = new Set();
const noSites: NonNullable<MapData['sites']> = [];

/** World map of a quantity by region or on a grid, in step with a table through `selected` and `hovered`. */
export function ForcingMap(props: Props) {
  const { label, unit, hatchMeans, onSelect, onHover } = props;
  const {
    regions,
    values,
    field,
    ramp = 'forcing',
    limit,
    floor,
    hatched,
    sites,
    selected,
    hovered,
    projection,
  } = props;
  const { mode } = useColourMode();
  const [showHatch, setShowHatch] = useState(true);
  const [showSites, setShowSites] = useState(true);
  const data = useMemo<MapData>(
    () => ({
      ...{ regions, values, field, ramp, limit, floor, selected, hovered, projection },
      hatched: showHatch ? hatched : noHatch,
      sites: showSites ? sites : noSites,
    }),
    [
      regions,
      values,
      field,
      ramp,
      limit,
      floor,
      selected,
      hovered,
      projection,
      hatched,
      sites,
      showHatch,
      showSites,
    ],
  );
  const named = regions.find((region) => region.code === (hovered ?? selected));
  const value = named && values?.[named.code];
  return (
    <div role="group" aria-label={label}>
      <div role="img" aria-label={label}>
        <Suspense fallback={<LoadingFigure height={320} label="Loading the map" />}>
          <MapCanvas {...{ data, mode, onSelect, onHover }} />
        </Suspense>
      </div>
      <div className="map-scale">
        <MapLegend
          {...{ ramp, limit, showHatch, showSites }}
          showRamp={Boolean(values ?? field)}
          floor={floor ?? limit / 1000}
          hatchMeans={
            hatched && hatched.size > 0
              ? (hatchMeans ?? 'fewer than 3 sites, or interval includes zero')
              : undefined
          }
          onHatch={setShowHatch}
          hasSites={Boolean(sites?.length)}
          onSites={setShowSites}
        />
        <span className="map-named">
          {named &&
            `${named.name}${typeof value === 'number' ? `: ${ramp === 'forcing' ? formatForcing(value) : formatNumber(value, { figures: 2 })} ${unit ?? ''}` : ''}`}
        </span>
      </div>
    </div>
  );
}

/** Gives a Figure its PNG and SVG of a map; the engine comes only when a file is asked for. */
export const mapPicture = (data: MapData) => (kind: 'png' | 'svg') =>
  import('./map-picture').then((engine) => engine.drawMap(kind, data));

/** Symmetric limit for maps that are compared: the largest size, rounded up to one figure. */
export function sharedLimit(values: Iterable<number | null | undefined>): number {
  let largest = 0;
  for (const value of values) largest = Math.max(largest, Math.abs(value ?? 0));
  if (largest === 0) return 1;
  const step = 10 ** Math.floor(Math.log10(largest));
  return Number((Math.ceil(largest / step - 1e-9) * step).toPrecision(2));
}

/** The sign of the hatching, for rows of tables. */
export const HatchSign = ({ meaning = 'few sites, or the interval includes zero' }: { meaning?: string }) => (
  <i className="map-hatch small" role="img" aria-label={meaning} title={meaning} />
);
