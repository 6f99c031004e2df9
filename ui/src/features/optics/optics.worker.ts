import { DomainError } from '@siltlight/common/physical/domain-error';
import type { ParticleDefinition } from '@siltlight/common/optics/species-optics';
import { curveSteps, type Curves } from './optics-curves';

/** `key`: which set of the page; a later task of the same set ends an earlier one. */
export type CurveTask = { key: string; id: number; definition: ParticleDefinition };
export type CurveAnswer = { key: string; id: number } & (
  { curves: Curves } | { fault: { field: string; message: string } }
);

/** Typing has rested for this long before the full precision begins. */
const REST_MS = 500;
/** Looks for newer tasks this often while it computes. */
const SLICE_MS = 25;

const latest = new Map<string, number>();
const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));
const isOld = ({ key, id }: CurveTask) => latest.get(key) !== id;
const answer = (message: CurveAnswer) => self.postMessage(message);

self.onmessage = ({ data }: MessageEvent<CurveTask>) => {
  latest.set(data.key, data.id);
  void serve(data);
};

async function serve(task: CurveTask): Promise<void> {
  const { key, id } = task;
  try {
    for (const precision of ['fast', 'full'] as const) {
      if (precision === 'full') await pause(REST_MS);
      const curves = await run(task, precision);
      if (!curves) return;
      answer({ key, id, curves });
    }
  } catch (error) {
    const field = error instanceof DomainError ? error.field : '';
    answer({ key, id, fault: { field, message: error instanceof Error ? error.message : String(error) } });
  }
}

/** null: a newer task has come. */
async function run(task: CurveTask, precision: 'fast' | 'full'): Promise<Curves | null> {
  const steps = curveSteps(task.definition, precision);
  let since = performance.now();
  while (!isOld(task)) {
    const step = steps.next();
    if (step.done) return step.value;
    if (performance.now() - since > SLICE_MS) {
      await pause(0);
      since = performance.now();
    }
  }
  return null;
}
