import type { ColumnSlice } from '@siltlight/common/wire/slices';

const FLOOR_PX = 32; // names and ages of neighbours touch below this
const HIATUS_PX = 5; // gap where two beds do not touch in time
const UNCONFORMITY_PX = 18; // above the scenarios of deep time
const LEAST_SCALE_PX = 1.5; // px per unit of the logarithm: thinner than this the column scrolls instead

export type Bed = {
  slice: ColumnSlice;
  topPx: number;
  heightPx: number;
  /** In the second lane, drawn inside the Stage it belongs to. */
  lens: boolean;
  /** Height of the row of its name: a Stage with lenses keeps only the top of its bed for itself. */
  rowPx: number;
  /** The bed does not touch the one above it. */
  afterHiatus: boolean;
};

export type StrataLayout = { beds: Bed[]; heightPx: number; unconformityPx: number | null };

const byAge = (a: ColumnSlice, b: ColumnSlice) => a.youngKa - b.youngKa || b.oldKa - a.oldKa;

/** Height of a bed: a floor that keeps it clickable, plus the logarithm of its duration. */
export const bedHeightPx = (slice: Pick<ColumnSlice, 'youngKa' | 'oldKa'>, scalePx: number) =>
  FLOOR_PX + scalePx * Math.log1p(Math.max(0, slice.oldKa - slice.youngKa) / 0.1);

/**
 * Places the beds, youngest on top, so that the column is filled exactly; where the floors alone need
 * more than there is, the layout is taller than the column and the column scrolls.
 */
export function strataLayout(slices: readonly ColumnSlice[], availablePx: number): StrataLayout {
  let low = LEAST_SCALE_PX;
  if (place(slices, low).heightPx >= availablePx) return place(slices, low);
  let high = availablePx;
  for (let step = 0; step < 40; step += 1) {
    const middle = (low + high) / 2;
    if (place(slices, middle).heightPx > availablePx) high = middle;
    else low = middle;
  }
  return place(slices, low);
}

function place(slices: readonly ColumnSlice[], scalePx: number): StrataLayout {
  const slugs = new Set(slices.map((slice) => slice.slug));
  const isLens = (slice: ColumnSlice) => slice.parentSlug !== null && slugs.has(slice.parentSlug);
  const top = slices.filter((slice) => !isLens(slice)).sort(byAge);
  const beds: Bed[] = [];
  let y = 4;
  let unconformityPx: number | null = null;
  let above: ColumnSlice | undefined;
  for (const kind of ['evidence', 'scenario'] as const) {
    for (const slice of top.filter((one) => one.kind === kind)) {
      if (kind === 'scenario' && unconformityPx === null && above) {
        unconformityPx = y + UNCONFORMITY_PX / 2;
        y += UNCONFORMITY_PX;
        above = undefined;
      }
      const afterHiatus = above !== undefined && slice.youngKa - above.oldKa > 0.05;
      if (afterHiatus) y += HIATUS_PX;
      y += placeBed(beds, slice, slices.filter(isLens), { y, scalePx, afterHiatus });
      above = slice;
    }
  }
  return { beds, heightPx: y + 4, unconformityPx };
}

type At = { y: number; scalePx: number; afterHiatus: boolean };

function placeBed(beds: Bed[], slice: ColumnSlice, lenses: ColumnSlice[], at: At): number {
  const inside = lenses.filter((lens) => rootOf(lens, lenses) === slice.slug).sort(byAge);
  const heights = inside.map((lens) => bedHeightPx(lens, at.scalePx));
  const filled = heights.reduce((sum, height) => sum + height, FLOOR_PX);
  const heightPx = Math.max(bedHeightPx(slice, at.scalePx), inside.length > 0 ? filled + 4 : 0);
  const rowPx = inside.length > 0 ? heightPx - filled + FLOOR_PX - 4 : heightPx;
  beds.push({ slice, topPx: at.y, heightPx, rowPx, lens: false, afterHiatus: at.afterHiatus });
  let y = at.y + rowPx;
  inside.forEach((lens, index) => {
    const height = heights[index]!;
    beds.push({ slice: lens, topPx: y, heightPx: height, rowPx: height, lens: true, afterHiatus: false });
    y += height;
  });
  return heightPx;
}

function rootOf(lens: ColumnSlice, lenses: ColumnSlice[]): string {
  let slug = lens.parentSlug!;
  for (let depth = 0; depth < 8; depth += 1) {
    const parent = lenses.find((one) => one.slug === slug);
    if (!parent?.parentSlug) return slug;
    slug = parent.parentSlug;
  }
  return slug;
}

/** Symmetric limit of the colours [W m⁻²]: the largest forcing rounded up to one figure. */
export function columnLimitWm2(slices: readonly ColumnSlice[]): number {
  const largest = Math.max(0, ...slices.map((slice) => Math.abs(slice.latestNetWm2 ?? 0)));
  if (largest === 0) return 0.5;
  const step = 10 ** Math.floor(Math.log10(largest));
  return Number((Math.ceil(largest / step - 1e-9) * step).toPrecision(2));
}
