import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { useMemo, type KeyboardEvent } from 'react';
import { Link } from 'react-router-dom';
import { formatAgeSpan, formatForcing } from '../../shared/number/format';
import { useColourMode } from '../../shared/theme/colour-mode';
import { columnLimitWm2, strataLayout, type Bed } from './strata-layout';
import { StrataDrawing } from './strata-drawing';
import './strata.css';

type Props = {
  slices: readonly ColumnSlice[];
  selected: string | null;
  open: boolean;
  heightPx: number;
  addressOf: (slug: string) => string;
};

/** Time slices as beds, youngest on top: a list of links for hand and ear, a section of rock for the eye. */
export function StrataColumn({ slices, selected, open, heightPx, addressOf }: Props) {
  const { mode } = useColourMode();
  const layout = useMemo(() => strataLayout(slices, heightPx), [slices, heightPx]);
  const rightPx = open ? 62 : 43;
  const first =
    selected && slices.some((slice) => slice.slug === selected) ? selected : layout.beds[0]?.slice.slug;
  return (
    <div className={open ? 'strata open' : 'strata'} style={{ height: layout.heightPx }}>
      <StrataDrawing {...{ layout, selected, rightPx, mode }} leftPx={10} limitWm2={columnLimitWm2(slices)} />
      <ol onKeyDown={moveByArrows('ArrowUp', 'ArrowDown')}>
        {layout.beds.map((bed) => (
          <li key={bed.slice.slug} style={{ top: bed.topPx, height: bed.rowPx }}>
            <BedLink
              {...{ bed, open, rightPx }}
              to={addressOf(bed.slice.slug)}
              on={bed.slice.slug === selected}
              reachable={bed.slice.slug === first}
            />
          </li>
        ))}
      </ol>
    </div>
  );
}

type BedLinkProps = { bed: Bed; open: boolean; rightPx: number; to: string; on: boolean; reachable: boolean };

function BedLink({ bed, open, rightPx, to, on, reachable }: BedLinkProps) {
  const { slice } = bed;
  const age = formatAgeSpan(slice.youngKa, slice.oldKa);
  return (
    <Link
      to={to}
      tabIndex={reachable ? 0 : -1}
      aria-current={on ? 'true' : undefined}
      aria-label={`${slice.name}, ${age}, ${inWords(slice)}`}
      title={`${slice.name}, ${age}`}
      style={{ paddingLeft: rightPx + (open ? 14 : 9) }}
    >
      <b>{open ? slice.name : slice.label}</b>
      {open && (
        <span className="strata-meta">
          {age}
          <i>{slice.latestNetWm2 === null ? 'no estimate' : formatForcing(slice.latestNetWm2)}</i>
        </span>
      )}
    </Link>
  );
}

/** What the colour and the ochre rule say, for those who do not see them. */
export function inWords(slice: ColumnSlice): string {
  const net =
    slice.latestNetWm2 === null
      ? 'no estimate yet'
      : `net forcing ${formatForcing(slice.latestNetWm2)} watts per square metre`;
  return slice.stale ? `${net}, inputs superseded` : net;
}

/** Arrow keys, Home and End move along the links of a list; Enter follows one. */
export const moveByArrows = (back: string, on: string) => (event: KeyboardEvent<HTMLElement>) => {
  const links = [...event.currentTarget.querySelectorAll<HTMLElement>('a')];
  const at = links.indexOf(document.activeElement as HTMLElement);
  const targets: Record<string, HTMLElement | undefined> = {
    [back]: links[at - 1],
    [on]: links[at + 1],
    Home: links[0],
    End: links.at(-1),
  };
  const target = targets[event.key];
  if (!target) return;
  event.preventDefault();
  target.focus();
};
