import type { EChartsCoreOption } from 'echarts/core';
import { css, mix, placeOnRamp, ramps } from '../theme/ramps';
import { colours, type ColourMode } from '../theme/tokens';
import { hatchTile } from './hatch';
import type { MapData, MapRegion } from './map-data';
import { projectionOf } from './projections';

export const WORLD = 'siltlight-world';

type Api = { coord: (place: readonly number[]) => number[] };
type Part = { region: MapRegion; ring: MapRegion['parts'][number] };

/** Parts in the order of drawing: the picked region last, or its neighbours' edges would cut its outline. */
export function partsOf({ regions, selected, hovered }: MapData): Part[] {
  const rank = (code: string) => (code === selected ? 2 : code === hovered ? 1 : 0);
  return regions
    .flatMap((region) => region.parts.map((ring) => ({ region, ring })))
    .sort((a, b) => rank(a.region.code) - rank(b.region.code));
}

export const colouringOf = (data: MapData, mode: ColourMode) => ({
  ramp: data.ramp ?? ('forcing' as const),
  limit: data.limit,
  floor: data.floor ?? data.limit / 1000,
  mode,
});

export function mapOption(
  data: MapData,
  parts: readonly Part[],
  picture: HTMLCanvasElement | undefined,
  mode: ColourMode,
  widthPx: number,
): EChartsCoreOption {
  return {
    animation: false,
    geo: geoLayer(data, Boolean(picture), mode),
    series: [
      ...(picture ? [rasterLayer(picture)] : []),
      regionLayer(data, parts, Boolean(picture), mode),
      siteLayer(data, mode, Math.min(1, Math.max(0.6, widthPx / 660))),
    ],
  };
}

const inkAt = (mode: ColourMode, light: number, dark: number) =>
  mode === 'light' ? `rgba(23,33,43,${light})` : `rgba(232,237,239,${dark})`;

function geoLayer(data: MapData, overPicture: boolean, mode: ColourMode) {
  const projection = projectionOf(data.projection ?? 'equal-earth');
  const light = mode === 'light';
  const land = light ? '#E6E1D3' : '#25323C';
  const coast = light ? '#2C3A45' : '#8796A1';
  return {
    map: WORLD,
    projection: {
      project: (place: [number, number]) => projection(place),
      unproject: (point: [number, number]) => projection.invert!(point),
    },
    // No `bottom`: with all four sides given the map is stretched to the box and the proportion is lost.
    left: 2,
    right: 2,
    top: 2,
    silent: true,
    roam: false,
    z: 3,
    itemStyle: { areaColor: 'transparent', borderColor: inkAt(mode, 0.13, 0.1), borderWidth: 0.7 },
    regions: [
      {
        name: 'land',
        itemStyle: {
          areaColor: overPicture || data.values ? 'transparent' : land,
          borderColor: coast,
          borderWidth: 0.75,
        },
      },
      { name: 'sphere', itemStyle: { borderColor: light ? '#6E7A84' : '#5B6B77', borderWidth: 1 } },
    ],
  };
}

const rasterLayer = (picture: HTMLCanvasElement) => ({
  type: 'custom',
  coordinateSystem: 'geo',
  data: [[0, 0]],
  z: 1,
  silent: true,
  renderItem: (_: unknown, api: Api) => {
    const x = api.coord([-180, 0])[0]!;
    const y = api.coord([0, 90])[1]!;
    const width = api.coord([180, 0])[0]! - x;
    return { type: 'image', style: { image: picture, x, y, width, height: api.coord([0, -90])[1]! - y } };
  },
});

function regionLayer(data: MapData, parts: readonly Part[], overPicture: boolean, mode: ColourMode) {
  const colouring = colouringOf(data, mode);
  const ramp = ramps[colouring.ramp][mode];
  const hatch = { image: hatchTile(inkAt(mode, 0.3, 0.26)), repeat: 'repeat' };
  const ink = colours[mode].slInk;
  const fillOf = (code: string) => {
    const value = overPicture ? null : data.values?.[code];
    // `transparent` is still met by the pointer, `none` is not.
    if (value === null || value === undefined) return 'transparent';
    return css(mix(ramp, placeOnRamp(colouring.ramp, value, colouring.limit, colouring.floor)));
  };
  return {
    type: 'custom',
    coordinateSystem: 'geo',
    z: 2,
    name: 'regions',
    data: parts.map(() => [0, 0]),
    renderItem: ({ dataIndex }: { dataIndex: number }, api: Api) => {
      const { region, ring } = parts[dataIndex]!;
      const points = alongEdges(ring, api);
      const on = region.code === data.selected;
      const over = region.code === data.hovered;
      const stroke = on || over ? ink : inkAt(mode, 0.4, 0.34);
      const lineWidth = on ? 2.2 : over ? 1.4 : 0.7;
      const children: unknown[] = [
        { type: 'polygon', shape: { points }, style: { fill: fillOf(region.code), stroke, lineWidth } },
      ];
      if (data.hatched?.has(region.code))
        children.push({ type: 'polygon', shape: { points }, style: { fill: hatch }, silent: true });
      return { type: 'group', children };
    },
  };
}

// Edges of a region are straight in longitude and latitude: extra points make them follow the projection.
function alongEdges(ring: Part['ring'], api: Api): number[][] {
  return ring.flatMap((from, at) => {
    const to = ring[(at + 1) % ring.length]!;
    const steps = Math.max(1, Math.ceil(Math.hypot(to[0] - from[0], to[1] - from[1]) / 3));
    return Array.from({ length: steps }, (_, step) =>
      api.coord([from[0] + ((to[0] - from[0]) * step) / steps, from[1] + ((to[1] - from[1]) * step) / steps]),
    );
  });
}

/** Diameter of a site's mark [px]: its area grows with the count of samples. */
export const siteDiameterPx = (sampleCount: number) => 3 + 0.62 * Math.sqrt(sampleCount);

const siteLayer = (data: MapData, mode: ColourMode, scale: number) => ({
  type: 'scatter',
  coordinateSystem: 'geo',
  z: 6,
  silent: true,
  data: (data.sites ?? []).map((site) => [site.longitudeDeg, site.latitudeDeg, site.sampleCount]),
  symbolSize: (value: number[]) => siteDiameterPx(value[2]!) * scale,
  itemStyle: { color: colours[mode].slInk, borderColor: colours[mode].slPaper, borderWidth: 1, opacity: 1 },
});
