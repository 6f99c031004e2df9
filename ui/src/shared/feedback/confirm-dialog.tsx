import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
} from '@fluentui/react-components';
import type { ReactNode } from 'react';

type Props = {
  open: boolean;
  title: string;
  children: ReactNode;
  /** The act itself, as a verb: "Withdraw version 2". */
  act: string;
  busy?: boolean;
  disabled?: boolean;
  onAct: () => void;
  onClose: () => void;
};

/** Asks before an act that cannot simply be undone. */
export function ConfirmDialog({ open, title, children, act, busy, disabled, onAct, onClose }: Props) {
  return (
    <Dialog open={open} modalType="alert" onOpenChange={(_, data) => !data.open && onClose()}>
      <DialogSurface>
        <DialogBody>
          <DialogTitle>{title}</DialogTitle>
          <DialogContent>{children}</DialogContent>
          <DialogActions>
            <Button onClick={onClose}>Keep as it is</Button>
            <Button appearance="primary" disabled={busy || disabled} onClick={onAct}>
              {act}
            </Button>
          </DialogActions>
        </DialogBody>
      </DialogSurface>
    </Dialog>
  );
}
