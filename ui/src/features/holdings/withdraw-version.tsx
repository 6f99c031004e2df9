import { Button, Textarea } from '@fluentui/react-components';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { toApiProblem } from '../../shared/api/api-problem';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { ErrorState } from '../../shared/feedback/error-state';
import { FormField } from '../../shared/form/form-field';
import { withdrawVersion } from './queries';

const SHORTEST = 3;

/** Takes a version out of use, with a reason that all who open it read. It stays readable. */
export function WithdrawVersion({ detail }: { detail: DatasetVersionDetail }) {
  const client = useQueryClient();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const { slug, version } = detail;
  const { mutate, isPending, error, reset } = useMutation({
    mutationFn: () => withdrawVersion(slug, version.number, reason.trim()),
    onSuccess: async () => {
      setOpen(false);
      await client.invalidateQueries({ queryKey: ['datasets'] });
    },
  });
  const problem = error ? toApiProblem(error) : null;
  return (
    <>
      <Button onClick={() => setOpen(true)}>Withdraw</Button>
      <ConfirmDialog
        open={open}
        title={`Withdraw version ${version.number}?`}
        act={`Withdraw version ${version.number}`}
        busy={isPending}
        disabled={reason.trim().length < SHORTEST}
        onAct={() => mutate()}
        onClose={() => {
          setOpen(false);
          reset();
        }}
      >
        <div className="sl-stack">
          <p>It stays readable with its reason. Fields and estimates that stand on it are marked.</p>
          {problem && <ErrorState error={problem} kept="Your reason is still here." fields={['reason']} />}
          <FormField name="reason" label="Reason" required problem={problem}>
            <Textarea
              rows={3}
              maxLength={4000}
              value={reason}
              onChange={(_, data) => setReason(data.value)}
            />
          </FormField>
        </div>
      </ConfirmDialog>
    </>
  );
}
