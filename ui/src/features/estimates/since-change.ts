import { useEffect, useRef, useState } from 'react';
import { formatNumber } from '../../shared/number/format';
import { methodName } from './method-words';
import type { SetUp } from './set-up';

const titles: Partial<Record<keyof SetUp, string>> = {
  field: 'field',
  optics: 'optical set',
  backdrop: 'ground and cloud',
  method: 'method',
  transmittance: 'transmittance',
  longwave: 'longwave',
  longwaveEfficiency: 'longwave efficiency',
  shortwaveEfficiency: 'shortwave efficiency',
};

function shown(name: keyof SetUp, value: SetUp[keyof SetUp]): string | null {
  if (name === 'method') return methodName(value as SetUp['method']);
  if (typeof value === 'boolean') return value ? 'on' : 'off';
  return typeof value === 'number' ? formatNumber(value, { decimals: decimalsGiven(value) }) : null;
}

const decimalsGiven = (value: number) => String(value).split('.')[1]?.length ?? 0;

/** Which inputs changed, in words: "transmittance 0.76 to 0.7". */
export function changesBetween(before: SetUp, after: SetUp): string[] {
  return (Object.keys(titles) as (keyof SetUp)[])
    .filter((name) => before[name] !== after[name])
    .map((name) => {
      const [from, to] = [shown(name, before[name]), shown(name, after[name])];
      return from === null || to === null ? `another ${titles[name]}` : `${titles[name]} ${from} to ${to}`;
    });
}

type Known = { setUp: SetUp; netWm2: number };
export type SinceChange = { changes: string[]; differenceWm2: number };

/** What the last change did to the net forcing, once its preview is there. */
export function useSinceChange(setUp: SetUp, netWm2: number | null): SinceChange | null {
  const last = useRef<Known | null>(null);
  const [since, setSince] = useState<SinceChange | null>(null);
  useEffect(() => {
    if (netWm2 === null) return;
    const before = last.current;
    if (before) {
      const changes = changesBetween(before.setUp, setUp);
      if (changes.length === 0) return;
      setSince({ changes, differenceWm2: netWm2 - before.netWm2 });
    }
    last.current = { setUp, netWm2 };
  }, [setUp, netWm2]);
  return since;
}
