import { Textarea } from '@fluentui/react-components';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { toApiProblem } from '../../shared/api/api-problem';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { FormField } from '../../shared/form/form-field';
import { withdraw } from './queries';

type Props = { estimate: EstimateDetail; open: boolean; onClose: () => void };

const SHORTEST_REASON = 3;

/** Takes a published estimate back; the reason stays with it for everybody to read. */
export function WithdrawDialog({ estimate, open, onClose }: Props) {
  const [reason, setReason] = useState('');
  const client = useQueryClient();
  const say = useSay();
  const act = useMutation({
    mutationFn: () => withdraw(estimate.id, reason.trim()),
    onSuccess: async () => {
      onClose();
      say('Withdrawn', 'The estimate stays readable, marked with your reason.');
      await client.invalidateQueries();
    },
  });
  return (
    <ConfirmDialog
      open={open}
      title={`Withdraw run ${estimate.runNumber}?`}
      act="Withdraw"
      busy={act.isPending}
      disabled={reason.trim().length < SHORTEST_REASON}
      onAct={() => act.mutate()}
      onClose={onClose}
    >
      {act.error && <ErrorState error={act.error} kept="Your reason is still here." fields={['reason']} />}
      <FormField
        name="reason"
        label="Reason"
        required
        hint="At least three characters. Everybody reads it."
        problem={act.error ? toApiProblem(act.error) : null}
      >
        <Textarea value={reason} maxLength={4000} rows={4} onChange={(_, data) => setReason(data.value)} />
      </FormField>
    </ConfirmDialog>
  );
}
