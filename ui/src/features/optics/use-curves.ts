import type { ParticleDefinition } from '@siltlight/common/optics/species-optics';
import { useEffect, useRef, useState } from 'react';
import type { Curves } from './optics-curves';
import type { CurveAnswer, CurveTask } from './optics.worker';

export type Wanted = { key: string; definition: ParticleDefinition };
export type Drawn = { curves?: Curves; fault?: { field: string; message: string } };

/** Curves of every set of the page, computed apart from it: at once in the fast setting, refined when typing rests. */
export function useCurves(wanted: readonly Wanted[]): ReadonlyMap<string, Drawn> {
  const [drawn, setDrawn] = useState<ReadonlyMap<string, Drawn>>(new Map());
  const worker = useRef<Worker>(null);
  const asked = useRef(new Map<string, { id: number; text: string }>());
  useEffect(() => {
    const made = new Worker(new URL('./optics.worker.ts', import.meta.url), { type: 'module' });
    worker.current = made;
    made.onmessage = ({ data }: MessageEvent<CurveAnswer>) => {
      if (asked.current.get(data.key)?.id !== data.id) return;
      // After a fault the last good curves stay in sight.
      setDrawn((before) =>
        new Map(before).set(
          data.key,
          'curves' in data ? { curves: data.curves } : { ...before.get(data.key), fault: data.fault },
        ),
      );
    };
    const known = asked.current;
    return () => {
      made.terminate();
      known.clear();
    };
  }, []);
  const text = JSON.stringify(wanted);
  useEffect(() => {
    for (const { key, definition } of JSON.parse(text) as Wanted[]) {
      const before = asked.current.get(key);
      const content = JSON.stringify(definition);
      if (before?.text === content) continue;
      const id = (before?.id ?? 0) + 1;
      asked.current.set(key, { id, text: content });
      worker.current?.postMessage({ key, id, definition } satisfies CurveTask);
    }
  }, [text]);
  return drawn;
}
