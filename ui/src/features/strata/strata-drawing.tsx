import { useId } from 'react';
import { forcingColour } from '../../shared/theme/ramps';
import type { ColourMode } from '../../shared/theme/tokens';
import type { Bed, StrataLayout } from './strata-layout';

type Props = {
  layout: StrataLayout;
  selected: string | null;
  leftPx: number;
  rightPx: number;
  limitWm2: number;
  mode: ColourMode;
};

const wave = (seed: number, x: number) => Math.sin(x / 9 + seed * 2.1) * 1.5 + Math.sin(x / 3.7 + seed) * 0.6;

function contact(seed: number, y: number, x0: number, x1: number, back = false): string {
  const xs = Array.from({ length: 13 }, (_, step) => x0 + ((x1 - x0) * step) / 12);
  return (back ? xs.reverse() : xs).map((x) => `${x.toFixed(1)} ${(y + wave(seed, x)).toFixed(1)}`).join('L');
}

/** A lens: two curves that meet in points at the left and right. */
function lensOutline(bed: Bed, x0: number, x1: number): string {
  const middle = bed.topPx + bed.heightPx / 2;
  const reach = ((bed.heightPx - 6) / 2) * (4 / 3); // a cubic goes three quarters of the way to its handles
  const [from, to] = [x0 + 3, x1 - 3];
  const curve = (y: number, a: number, b: number, end: number) => `C${a} ${y} ${b} ${y} ${end} ${middle}`;
  return `M${x0} ${middle}${curve(middle - reach, from, to, x1)}${curve(middle + reach, to, from, x0)}Z`;
}

/** The rock: beds with shared wavy contacts, lenses in a second lane, an unconformity above deep time. */
export function StrataDrawing({ layout, selected, leftPx, rightPx, limitWm2, mode }: Props) {
  const { beds, heightPx, unconformityPx } = layout;
  const own = useId();
  const main = beds.filter((bed) => !bed.lens);
  const lensLeft = leftPx + (rightPx - leftPx) * 0.42;
  const outline = (bed: Bed) => {
    if (bed.lens) return lensOutline(bed, lensLeft, rightPx - 2);
    const at = main.indexOf(bed);
    const next = main[at + 1];
    const touches = next && !next.afterHiatus && next.slice.kind === bed.slice.kind;
    const bottom = contact(touches ? at + 1 : at + 40, bed.topPx + bed.heightPx, leftPx, rightPx, true);
    return `M${contact(at, bed.topPx, leftPx, rightPx)}L${bottom}Z`;
  };
  const shown = [...beds].sort((a, b) => Number(a.lens) - Number(b.lens));
  return (
    <svg width={rightPx + 12} height={heightPx} aria-hidden="true" className="strata-draw">
      {shown.map((bed, at) => (
        <BedShape
          key={bed.slice.slug}
          bed={bed}
          path={outline(bed)}
          clip={`${own}-${at}`}
          seed={at}
          fromPx={bed.lens ? lensLeft : leftPx}
          {...{ rightPx, limitWm2, mode }}
        />
      ))}
      {shown
        .filter((bed) => bed.slice.slug === selected)
        .map((bed) => (
          <path key="on" d={outline(bed)} className="bed-on" />
        ))}
      {unconformityPx !== null && (
        <path d={`M${leftPx - 6} ${unconformityPx}q4 -5 8 0t8 0 8 0 8 0 8 0`} className="unconformity" />
      )}
    </svg>
  );
}

type ShapeProps = {
  bed: Bed;
  path: string;
  clip: string;
  seed: number;
  fromPx: number;
  rightPx: number;
  limitWm2: number;
  mode: ColourMode;
};

function BedShape({ bed, path, clip, seed, fromPx, rightPx, limitWm2, mode }: ShapeProps) {
  const net = bed.slice.latestNetWm2;
  const deep = net !== null && Math.abs(net) / limitWm2 > 0.55;
  return (
    <g>
      <path
        d={path}
        className={['bed', net === null && 'blank', bed.lens && 'lens'].filter(Boolean).join(' ')}
        style={net === null ? undefined : { fill: forcingColour(net, limitWm2, mode) }}
      />
      {net !== null && (
        <>
          <clipPath id={clip}>
            <path d={path} />
          </clipPath>
          <g clipPath={`url(#${clip})`} className={deep ? 'laminae on-deep' : 'laminae'}>
            {Array.from({ length: Math.floor(bed.heightPx / 6) }, (_, line) => (
              <path
                key={line}
                d={`M${contact(seed + line * 0.7, bed.topPx + 5 + line * 6, fromPx, rightPx)}`}
                strokeDasharray={`${5 + ((seed * 7 + line * 5) % 13)} ${3 + ((line * 3 + seed) % 5)} ${9 + ((line * 11) % 9)} 4`}
              />
            ))}
          </g>
        </>
      )}
      {bed.slice.stale && (
        <rect
          x={rightPx + 2.5}
          y={bed.topPx + 3}
          width={3}
          height={bed.heightPx - 6}
          className="stale-rule"
        />
      )}
    </g>
  );
}
