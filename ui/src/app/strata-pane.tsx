import { Button } from '@fluentui/react-components';
import { ChevronDoubleLeft20Regular, ChevronDoubleRight20Regular } from '@fluentui/react-icons';
import { useQuery } from '@tanstack/react-query';
import { useLayoutEffect, useRef, useState } from 'react';
import { useLocation, useParams } from 'react-router-dom';
import { columnQuery } from '../features/strata/queries';
import { StrataColumn } from '../features/strata/strata-column';
import { columnLimitWm2 } from '../features/strata/strata-layout';
import { StrataStrip } from '../features/strata/strata-strip';
import { formatNumber } from '../shared/number/format';
import { ForcingUnit } from '../shared/number/unit';
import { useDeclaredSlice } from '../shared/page/slice-of-page';
import { WordMark } from '../shared/page/word-mark';
import { useColourMode } from '../shared/theme/colour-mode';
import { gradient, ramps } from '../shared/theme/ramps';

const listsBySlice = ['/estimates', '/exports'];

/** Which slice the page is about, and where picking another one leads: lists filter, all else opens the slice. */
function usePickedSlice() {
  const { pathname, search } = useLocation();
  const { slug } = useParams();
  const declared = useDeclaredSlice();
  const inList = listsBySlice.includes(pathname);
  const selected = pathname.startsWith('/slices/')
    ? (slug ?? null)
    : (declared ?? new URLSearchParams(search).get('slice'));
  const addressOf = (one: string) =>
    inList ? `${pathname}?slice=${encodeURIComponent(one)}` : `/slices/${encodeURIComponent(one)}`;
  return { selected, addressOf };
}

/** The column at the left edge, from the latest published estimates. */
export function StrataPane({ open, onToggle }: { open: boolean; onToggle: () => void }) {
  const { data: slices = [], isError, refetch } = useQuery(columnQuery);
  const { mode } = useColourMode();
  const picked = usePickedSlice();
  const [ref, heightPx] = useHeight();
  const limit = formatNumber(columnLimitWm2(slices), { figures: 1 });
  const toggle = open ? 'Close the column' : 'Open the column';
  return (
    <nav className="frame-column" aria-label="Time slices, youngest first">
      <div className="frame-cap">
        <WordMark />
        {open && (
          <span>
            Time slices<small>youngest on top</small>
          </span>
        )}
      </div>
      <div className="frame-beds" ref={ref}>
        {isError && (
          <Button size="small" appearance="subtle" onClick={() => void refetch()}>
            Load slices again
          </Button>
        )}
        {slices.length > 0 && <StrataColumn {...{ slices, open, heightPx, ...picked }} />}
      </div>
      <div className="frame-foot">
        {open && (
          <div className="frame-key">
            <div style={{ background: gradient(ramps.forcing[mode]) }} />
            <div>
              <span>{`\u2212${limit}`}</span>
              <span>0</span>
              <span>+{limit}</span>
            </div>
            <small>
              net forcing, <ForcingUnit />
            </small>
          </div>
        )}
        <Button
          appearance="subtle"
          size="small"
          aria-label={toggle}
          title={toggle}
          aria-expanded={open}
          onClick={onToggle}
          icon={open ? <ChevronDoubleLeft20Regular /> : <ChevronDoubleRight20Regular />}
        />
      </div>
    </nav>
  );
}

export function StrataStripPane() {
  const { data: slices = [] } = useQuery(columnQuery);
  const picked = usePickedSlice();
  return (
    <nav className="frame-strip" aria-label="Time slices, youngest first">
      <StrataStrip slices={slices} {...picked} />
    </nav>
  );
}

function useHeight() {
  const ref = useRef<HTMLDivElement>(null);
  const [heightPx, setHeight] = useState(792);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return undefined;
    const take = () => element.clientHeight > 0 && setHeight(element.clientHeight);
    take();
    const watch = new ResizeObserver(take);
    watch.observe(element);
    return () => watch.disconnect();
  }, []);
  return [ref, heightPx] as const;
}
