import type { Scale } from './scale';

export type LinePoint = { x: number; y: number; low?: number; high?: number };

const at = (x: number, y: number) => `${x.toFixed(1)} ${y.toFixed(1)}`;

export const linePath = (points: readonly LinePoint[], x: Scale, y: Scale) =>
  points.map((point, index) => `${index ? 'L' : 'M'}${at(x(point.x), y(point.y))}`).join('');

/** The band between low and high; empty where no point carries one. */
export function ribbonPath(points: readonly LinePoint[], x: Scale, y: Scale): string {
  const banded = points.filter((point) => point.low !== undefined && point.high !== undefined);
  if (banded.length < 2) return '';
  const up = banded.map((point) => at(x(point.x), y(point.high!)));
  const down = [...banded].reverse().map((point) => at(x(point.x), y(point.low!)));
  return `M${[...up, ...down].join('L')}Z`;
}

/** Pushes labels apart so that neighbours keep a distance, in their own order. */
export function partLabels(places: readonly number[], distancePx: number): number[] {
  const order = places.map((_, index) => index).sort((a, b) => places[a]! - places[b]!);
  const parted = [...places];
  order.forEach((index, rank) => {
    const before = order[rank - 1];
    if (before !== undefined) parted[index] = Math.max(parted[index]!, parted[before]! + distancePx);
  });
  return parted;
}
