import type { PhasePoint } from './optics-curves';

const RADIUS_PX = 108;

/** Rings at powers of ten; the innermost stands away from the centre, where no logarithm has a place. */
export function polarRings(values: readonly number[]) {
  const low = Math.floor(Math.log10(Math.min(...values)));
  const high = Math.max(low + 1, Math.ceil(Math.log10(Math.max(...values))));
  const rings = Array.from({ length: high - low + 1 }, (_, at) => Number(`1e${low + at}`));
  const radiusOf = (value: number) => (RADIUS_PX * (Math.log10(value) - low + 0.4)) / (high - low + 0.4);
  return { rings, radiusOf };
}

/** Both halves of the closed curve: the phase function is the same above and below. */
export function polarPath(points: readonly PhasePoint[], radiusOf: (value: number) => number): string {
  const upper = points.map(({ angleDeg, value }) => at(angleDeg, radiusOf(value)));
  const lower = [...points].reverse().map(({ angleDeg, value }) => at(-angleDeg, radiusOf(value)));
  return `M${[...upper, ...lower].join('L')}Z`;
}

function at(angleDeg: number, radiusPx: number): string {
  const angle = (angleDeg * Math.PI) / 180;
  return `${(radiusPx * Math.cos(angle)).toFixed(1)} ${(-radiusPx * Math.sin(angle)).toFixed(1)}`;
}
