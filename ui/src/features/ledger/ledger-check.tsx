import {
  CheckmarkCircle16Filled,
  ErrorCircle16Filled,
  ShieldCheckmark20Regular,
} from '@fluentui/react-icons';
import { Button } from '@fluentui/react-components';
import { useMutation } from '@tanstack/react-query';
import { ErrorState } from '../../shared/feedback/error-state';
import { counted } from '../../shared/number/format';
import { verifyLedger } from './queries';

/** Walks the chain of hashes at the service and says whether every row still fits the one before. */
export function useLedgerCheck() {
  const check = useMutation({ mutationFn: verifyLedger });
  const button = (
    <Button
      appearance="primary"
      icon={<ShieldCheckmark20Regular />}
      disabled={check.isPending}
      onClick={() => check.mutate()}
    >
      {check.isPending ? 'Walking the chain' : 'Verify the chain'}
    </Button>
  );
  return { button, outcome: <Outcome check={check} /> };
}

function Outcome({
  check,
}: {
  check: ReturnType<typeof useMutation<Awaited<ReturnType<typeof verifyLedger>>>>;
}) {
  if (check.error) return <ErrorState error={check.error} retry={() => check.mutate()} />;
  if (!check.data) return null;
  const { intact, rows, head, firstBroken } = check.data;
  return (
    <p role="status" className="caution">
      {intact ? (
        <CheckmarkCircle16Filled color="var(--slMoss)" aria-hidden />
      ) : (
        <ErrorCircle16Filled color="var(--slRust)" aria-hidden />
      )}
      <span>
        {intact
          ? `The chain holds over ${counted(rows, 'row')}; its head is ${head.slice(0, 16)}.`
          : `The chain breaks at row ${firstBroken?.position ?? 0}: ${firstBroken?.problem ?? ''} Tell an administrator and restore from a backup.`}
      </span>
    </p>
  );
}
