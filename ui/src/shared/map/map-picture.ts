import { rasterise } from '../figure/picture';
import type { MapData } from './map-data';
import { echarts } from './map-engine';
import { colouringOf, mapOption, partsOf } from './map-option';
import { aspectOf } from './projections';
import { paintRaster } from './raster';

const WIDTH_PX = 1320;
const PAPER = '#FFFFFF';

/** A map drawn for a file, always in the light colours. */
export async function drawMap(kind: 'png' | 'svg', data: MapData): Promise<Blob> {
  const projection = data.projection ?? 'equal-earth';
  const height = Math.round(WIDTH_PX * aspectOf[projection]) + 4;
  const picture = data.field && paintRaster(data.field, projection, colouringOf(data, 'light'));
  const chart = echarts.init(null, null, { renderer: 'svg', ssr: true, width: WIDTH_PX, height });
  try {
    chart.setOption({
      ...mapOption(data, partsOf(data), picture, 'light', WIDTH_PX),
      backgroundColor: PAPER,
    });
    const svg = chart.renderToSVGString();
    if (kind === 'svg') return new Blob([svg], { type: 'image/svg+xml' });
    return await rasterise(svg, WIDTH_PX, height);
  } finally {
    chart.dispose();
  }
}
