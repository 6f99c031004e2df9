import { mix, placeOnRamp, ramps, type RampName } from '../theme/ramps';
import type { ColourMode } from '../theme/tokens';
import { aspectOf, projectionOf, type ProjectionName } from './projections';

/** A field on a regular grid: rows from south to north, from 180° W eastwards, at the centres of the cells. */
export type RasterField = { stepDeg: number; values: ArrayLike<number | null> };

const RASTER_WIDTH_PX = 900;
const indices = new Map<string, Int32Array>();

/** Cell of the grid under each pixel, −1 outside the outline; kept, as it costs far more than the colouring. */
function cellIndex(name: ProjectionName, stepDeg: number): Int32Array {
  const key = `${name} ${stepDeg}`;
  const kept = indices.get(key);
  if (kept) return kept;
  const index = invertProjection(name, stepDeg);
  indices.set(key, index);
  return index;
}

function invertProjection(name: ProjectionName, stepDeg: number): Int32Array {
  const projection = projectionOf(name);
  const at = (lon: number, lat: number) => projection([lon, lat])!;
  const [left, right] = [at(-180, 0)[0], at(180, 0)[0]];
  const [top, bottom] = [at(0, 90)[1], at(0, -90)[1]];
  const height = Math.round(RASTER_WIDTH_PX * aspectOf[name]);
  const columns = Math.round(360 / stepDeg);
  const index = new Int32Array(RASTER_WIDTH_PX * height).fill(-1);
  const middle = (left + right) / 2;
  for (let row = 0; row < height; row += 1) {
    const y = top + ((row + 0.5) / height) * (bottom - top);
    for (let column = 0; column < RASTER_WIDTH_PX; column += 1) {
      const x = left + ((column + 0.5) / RASTER_WIDTH_PX) * (right - left);
      const [lon, lat] = projection.invert!([x, y])!;
      // Outside the outline the inverse wraps round: compare with the edge of this row.
      if (Math.abs(x - middle) > at(180, lat)[0] - middle) continue;
      const cellRow = Math.min(columns / 2 - 1, Math.floor((lat + 90) / stepDeg));
      const cellColumn = Math.min(columns - 1, Math.floor((lon + 180) / stepDeg));
      index[row * RASTER_WIDTH_PX + column] = cellRow * columns + cellColumn;
    }
  }
  return index;
}

export type Colouring = { ramp: RampName; limit: number; floor: number; mode: ColourMode };

/** The field as a picture in the projection, painted once for each field and colouring. */
export function paintRaster(
  field: RasterField,
  name: ProjectionName,
  colouring: Colouring,
): HTMLCanvasElement {
  const canvas = document.createElement('canvas');
  canvas.width = RASTER_WIDTH_PX;
  canvas.height = Math.round(RASTER_WIDTH_PX * aspectOf[name]);
  const context = canvas.getContext('2d')!;
  const picture = context.createImageData(canvas.width, canvas.height);
  const ramp = ramps[colouring.ramp][colouring.mode];
  const colours = Array.from({ length: 256 }, (_, step) => mix(ramp, step / 255));
  cellIndex(name, field.stepDeg).forEach((cell, pixel) => {
    const value = cell < 0 ? null : field.values[cell];
    if (value === null || value === undefined || !Number.isFinite(value)) return;
    const place = placeOnRamp(colouring.ramp, value, colouring.limit, colouring.floor);
    const colour = colours[Math.round(Math.min(1, Math.max(0, place)) * 255)]!;
    picture.data.set(colour, pixel * 4);
    picture.data[pixel * 4 + 3] = 255;
  });
  context.putImageData(picture, 0, 0);
  return canvas;
}
