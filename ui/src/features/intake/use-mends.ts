import { useCallback, useMemo, useState } from 'react';
import { useSay } from '../../shared/feedback/toasts';
import { correct, type NewCorrection } from './changes';
import { keyOf } from './places';
import type { Changing } from './use-change';

const AT_ONCE = 5000;

const keyOfMend = ({ sheet, column, row }: NewCorrection) => keyOf(sheet, column, row);

/** Mends on their way: shown at once, and kept to be sent again where they were refused. */
export function useMends({ change }: Changing) {
  const say = useSay();
  const [unsent, setUnsent] = useState<readonly NewCorrection[]>([]);
  const send = useCallback(
    async (cells: NewCorrection[]) => {
      const keys = new Set(cells.map(keyOfMend));
      setUnsent((before) => [...before.filter((one) => !keys.has(keyOfMend(one))), ...cells]);
      for (let from = 0; from < cells.length; from += AT_ONCE) {
        const part = cells.slice(from, from + AT_ONCE);
        if (!(await change(correct(part)))) return;
        const sent = new Set(part);
        setUnsent((before) => before.filter((one) => !sent.has(one)));
      }
      if (cells.length > 1) say(`${cells.length} cells mended`, 'Each can be undone under Mends.');
    },
    [change, say],
  );
  const byCell = useMemo(() => new Map(unsent.map((one) => [keyOfMend(one), one.text])), [unsent]);
  return {
    send,
    unsent: byCell,
    resend: useCallback(() => send([...unsent]), [send, unsent]),
    drop: useCallback(() => setUnsent([]), []),
  };
}
