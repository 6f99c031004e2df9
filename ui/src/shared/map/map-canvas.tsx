import ReactEChartsCore from 'echarts-for-react/esm/core';
import { useMemo, useRef } from 'react';
import { useWidth } from '../figure/use-width';
import type { ColourMode } from '../theme/tokens';
import type { MapData } from './map-data';
import { echarts } from './map-engine';
import { colouringOf, mapOption, partsOf } from './map-option';
import { aspectOf } from './projections';
import { paintRaster } from './raster';

type Props = {
  data: MapData;
  mode: ColourMode;
  onSelect?: (code: string | null) => void;
  onHover?: (code: string | null) => void;
};

type Hit = { seriesName?: string; dataIndex?: number };

/** The drawing itself. It comes in its own chunk, as the chart engine is larger than the rest of the client. */
export default function MapCanvas({ data, mode, onSelect, onHover }: Props) {
  const [ref, widthPx] = useWidth(0);
  const projection = data.projection ?? 'equal-earth';
  const { field, ramp, limit, floor, regions, selected, hovered } = data;
  // Painted apart from the option: picking a region must not repaint the field.
  const picture = useMemo(
    () => field && paintRaster(field, projection, colouringOf({ regions: [], ramp, limit, floor }, mode)),
    [field, projection, ramp, limit, floor, mode],
  );
  const parts = useMemo(
    () => partsOf({ regions, limit: 1, selected, hovered }),
    [regions, selected, hovered],
  );
  const option = useMemo(
    () => mapOption(data, parts, picture, mode, widthPx),
    [data, parts, picture, mode, widthPx],
  );

  // One handler object for ever: a new one restarts the chart. What it calls is kept current beside it.
  const current = useRef({ parts, onSelect, onHover });
  current.current = { parts, onSelect, onHover };
  const events = useMemo(() => {
    const codeOf = (hit: Hit) =>
      hit.seriesName === 'regions' ? (current.current.parts[hit.dataIndex ?? -1]?.region.code ?? null) : null;
    return {
      click: (hit: Hit) => current.current.onSelect?.(codeOf(hit)),
      mouseover: (hit: Hit) => current.current.onHover?.(codeOf(hit)),
      globalout: () => current.current.onHover?.(null),
    };
  }, []);
  return (
    <div ref={ref} aria-hidden="true">
      {widthPx > 0 && (
        <ReactEChartsCore
          echarts={echarts}
          option={option}
          notMerge
          onEvents={events}
          style={{ height: Math.round(widthPx * aspectOf[projection]) + 4 }}
        />
      )}
    </div>
  );
}
