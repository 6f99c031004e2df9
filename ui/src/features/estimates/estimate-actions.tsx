import {
  Button,
  Menu,
  MenuItem,
  MenuList,
  MenuPopover,
  MenuTrigger,
  Tooltip,
} from '@fluentui/react-components';
import {
  CheckmarkCircle20Regular,
  DocumentText20Regular,
  MoreHorizontal20Regular,
} from '@fluentui/react-icons';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';
import { useHasRole } from '../../shared/api/session';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { useSay } from '../../shared/feedback/toasts';
import { runAgain, runRecordAddress, signOff } from './queries';
import { WithdrawDialog } from './withdraw-dialog';

type Props = { estimate: EstimateDetail; exportMenu: ReactNode };

/** What may be done with an estimate: a second person signs it off, it is withdrawn, run again, handed on. */
export function EstimateActions({ estimate, exportMenu }: Props) {
  const { id, state, rights } = estimate;
  const isScientist = useHasRole('scientist');
  const [asking, setAsking] = useState<'sign-off' | 'withdraw' | null>(null);
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useSay();
  const again = useMutation({
    mutationFn: () => runAgain(id),
    onSuccess: async (accepted) => {
      await client.invalidateQueries({ queryKey: ['jobs'] });
      await navigate(`/estimates/${accepted.id}`);
    },
    onError: (error) => say('The run was not started', error.message, 'error'),
  });
  const hasResult = estimate.result !== null;
  return (
    <>
      <Menu>
        <MenuTrigger disableButtonEnhancement>
          <Button icon={<MoreHorizontal20Regular />} aria-label="More acts" />
        </MenuTrigger>
        <MenuPopover>
          <MenuList>
            <MenuItem disabled={!isScientist || again.isPending} onClick={() => again.mutate()}>
              Run again
            </MenuItem>
            <MenuItem disabled={!rights.mayWithdraw} onClick={() => setAsking('withdraw')}>
              Withdraw
            </MenuItem>
            <MenuItem onClick={() => window.print()}>Print</MenuItem>
          </MenuList>
        </MenuPopover>
      </Menu>
      {hasResult && (
        <Button as="a" href={runRecordAddress(id)} download icon={<DocumentText20Regular />}>
          Run record
        </Button>
      )}
      {state === 'computed' && <SignOffButton rights={rights} onAsk={() => setAsking('sign-off')} />}
      {hasResult && exportMenu}
      <SignOffDialog estimate={estimate} open={asking === 'sign-off'} onClose={() => setAsking(null)} />
      <WithdrawDialog estimate={estimate} open={asking === 'withdraw'} onClose={() => setAsking(null)} />
    </>
  );
}

function SignOffButton({ rights, onAsk }: { rights: EstimateDetail['rights']; onAsk: () => void }) {
  const button = (
    <Button
      appearance="primary"
      icon={<CheckmarkCircle20Regular />}
      disabledFocusable={!rights.maySignOff}
      onClick={onAsk}
    >
      Sign off
    </Button>
  );
  if (rights.maySignOff || !rights.whyNot) return button;
  return (
    <Tooltip content={rights.whyNot} relationship="description">
      {button}
    </Tooltip>
  );
}

type DialogProps = { estimate: EstimateDetail; open: boolean; onClose: () => void };

function SignOffDialog({ estimate, open, onClose }: DialogProps) {
  const client = useQueryClient();
  const say = useSay();
  const act = useMutation({
    mutationFn: () => signOff(estimate.id),
    onSuccess: async () => {
      onClose();
      say('Signed off and published', 'The stratum takes its colour; the author is told by mail.');
      await client.invalidateQueries();
    },
    onError: (error) => {
      onClose();
      say('Not signed off', error.message, 'error');
    },
  });
  return (
    <ConfirmDialog
      open={open}
      title={`Sign off run ${estimate.runNumber}?`}
      act="Sign off and publish"
      busy={act.isPending}
      onAct={() => act.mutate()}
      onClose={onClose}
    >
      Your name stands beside {estimate.createdBy.name}’s. The estimate is published and can no longer be
      changed, only withdrawn with a reason.
    </ConfirmDialog>
  );
}
