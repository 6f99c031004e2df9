import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useCallback, useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { CellPlace } from './changes';
import { addressOf, firstPlace, readAddress } from './places';

const WRITE_AFTER_MS = 350;

/**
 * The cell that is picked, in the address as `sheet` and `cell`, so that a link leads to it. Walking through the
 * grid writes the address only when it rests; opening another link (or going back) moves the pick.
 */
export function usePlace(detail: SubmissionDetail) {
  const [params, setParams] = useSearchParams();
  const inAddress = `${params.get('sheet') ?? ''}!${params.get('cell') ?? ''}`;
  const [place, setPlace] = useState<CellPlace>(() => placeFrom(params, detail));
  const written = useRef(inAddress);
  const waiting = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    if (inAddress === written.current) return;
    written.current = inAddress;
    setPlace(placeFrom(params, detail));
    // Only another address moves the pick; a newer state of the submission does not.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [inAddress]);
  useEffect(() => () => clearTimeout(waiting.current), []);

  const pick = useCallback(
    (next: CellPlace) => {
      setPlace(next);
      clearTimeout(waiting.current);
      waiting.current = setTimeout(() => {
        written.current = `${next.sheet}!${addressOf(next)}`;
        setParams(
          (before) => {
            const after = new URLSearchParams(before);
            after.set('sheet', next.sheet);
            after.set('cell', addressOf(next));
            return after;
          },
          { replace: true, preventScrollReset: true },
        );
      }, WRITE_AFTER_MS);
    },
    [setParams],
  );
  return [place, pick] as const;
}

function placeFrom(params: URLSearchParams, detail: SubmissionDetail): CellPlace {
  const first = firstPlace(detail);
  const asked = params.get('sheet');
  const sheet = detail.workbook.sheets.find(({ name }) => name === asked);
  if (!sheet) return { ...first, ...readAddress(params.get('cell')) };
  const table = detail.mapping.tables.find((one) => one.used && one.sheet === sheet.name);
  const start = sheet.name === first.sheet ? first : { row: table?.firstRow ?? 1, column: 'A' };
  const cell = readAddress(params.get('cell'));
  return { ...start, sheet: sheet.name, ...(cell && cell.row <= sheet.rowCount ? cell : {}) };
}
