import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import { forcingColour } from '../../shared/theme/ramps';
import { useColourMode } from '../../shared/theme/colour-mode';
import { inWords, moveByArrows } from './strata-column';
import { columnLimitWm2, strataLayout } from './strata-layout';
import './strata.css';

type Props = { slices: readonly ColumnSlice[]; selected: string | null; addressOf: (slug: string) => string };

/** The column laid on its side for narrow screens, the picked slice scrolled to the middle. */
export function StrataStrip({ slices, selected, addressOf }: Props) {
  const { mode } = useColourMode();
  const list = useRef<HTMLOListElement>(null);
  const limit = columnLimitWm2(slices);
  useEffect(() => {
    const on = list.current?.querySelector<HTMLElement>('[aria-current]');
    if (on && list.current) list.current.scrollLeft = on.offsetLeft - list.current.clientWidth / 2 + 29;
  }, [selected, slices]);
  return (
    <ol className="strip" ref={list} onKeyDown={moveByArrows('ArrowLeft', 'ArrowRight')}>
      {strataLayout(slices, 0).beds.map(({ slice, lens }) => (
        <li key={slice.slug}>
          <Link
            to={addressOf(slice.slug)}
            aria-current={slice.slug === selected ? 'true' : undefined}
            aria-label={`${slice.name}, ${inWords(slice)}`}
          >
            <i
              className={`${slice.latestNetWm2 === null ? 'blank' : ''} ${lens ? 'lens' : ''}`}
              style={
                slice.latestNetWm2 === null
                  ? undefined
                  : { background: forcingColour(slice.latestNetWm2, limit, mode) }
              }
            />
            {slice.stale && <u />}
            <span>{slice.label}</span>
          </Link>
        </li>
      ))}
    </ol>
  );
}
