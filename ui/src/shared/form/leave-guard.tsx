import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { ConfirmDialog } from '../feedback/confirm-dialog';

/** Warns before unsaved input is left, by navigation inside the client or by closing the window. */
export function LeaveGuard({
  when,
  what = 'What you entered here is not saved yet.',
}: {
  when: boolean;
  what?: string;
}) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => when && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!when) return undefined;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [when]);
  return (
    <ConfirmDialog
      open={blocker.state === 'blocked'}
      title="Leave this page?"
      act="Leave without saving"
      onAct={() => blocker.proceed?.()}
      onClose={() => blocker.reset?.()}
    >
      {what}
    </ConfirmDialog>
  );
}
