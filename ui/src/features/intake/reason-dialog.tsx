import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  Textarea,
} from '@fluentui/react-components';
import { useState, type FormEvent, type ReactNode } from 'react';
import type { ApiProblem } from '../../shared/api/api-problem';
import { ErrorState } from '../../shared/feedback/error-state';
import { FormField } from '../../shared/form/form-field';
import { submitOnCtrlEnter } from '../../shared/form/submit-keys';

export type ReasonWanted = {
  title: string;
  act: string;
  note?: ReactNode;
  send: (reason: string) => Promise<boolean>;
};

const SHORTEST = 3;

type Props = { wanted: ReasonWanted; busy: boolean; problem: ApiProblem | null; onClose: () => void };

/** Asks why. What was typed stays until the service has taken it. */
export function ReasonDialog({ wanted, busy, problem, onClose }: Props) {
  const [reason, setReason] = useState('');
  const [sent, setSent] = useState(false);
  const short = reason.trim().length < SHORTEST;
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (!short && (await wanted.send(reason.trim()))) onClose();
  };
  return (
    <Dialog open modalType="modal" onOpenChange={(_, data) => !data.open && onClose()}>
      <DialogSurface>
        <form onSubmit={(event) => void submit(event)} onKeyDown={submitOnCtrlEnter}>
          <DialogBody>
            <DialogTitle>{wanted.title}</DialogTitle>
            <DialogContent className="sl-stack">
              {wanted.note && <p className="sl-13 sl-second">{wanted.note}</p>}
              {sent && problem && (
                <ErrorState error={problem} kept="Your reason is still here." fields={['reason']} />
              )}
              <FormField
                name="reason"
                label="Reason"
                required
                problem={sent ? problem : null}
                fault={sent && short ? `Give a reason of at least ${SHORTEST} characters.` : undefined}
              >
                <Textarea
                  autoFocus
                  rows={4}
                  maxLength={4000}
                  value={reason}
                  onChange={(_, data) => setReason(data.value)}
                />
              </FormField>
            </DialogContent>
            <DialogActions>
              <Button onClick={onClose}>Keep as it is</Button>
              <Button type="submit" appearance="primary" disabled={busy}>
                {wanted.act}
              </Button>
            </DialogActions>
          </DialogBody>
        </form>
      </DialogSurface>
    </Dialog>
  );
}
