import type { EstimateSummary } from '@siltlight/common/wire/estimates';
import { StateTag } from '../../shared/page/state-tag';

export const estimateStates: Record<EstimateSummary['state'], string> = {
  queued: 'Queued',
  running: 'Running',
  failed: 'Failed',
  cancelled: 'Cancelled',
  computed: 'Awaits sign-off',
  published: 'Published',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
};

/** State of an estimate; one whose inputs have been superseded says so besides. */
export function EstimateState({ of: { state, stale } }: { of: Pick<EstimateSummary, 'state' | 'stale'> }) {
  return (
    <span className="estimate-states">
      <StateTag state={state === 'computed' ? 'awaiting-sign-off' : state} word={estimateStates[state]} />
      {stale && <StateTag state="stale" />}
    </span>
  );
}
