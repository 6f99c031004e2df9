import { Button } from '@fluentui/react-components';
import { ErrorState } from '../../shared/feedback/error-state';
import { counted } from '../../shared/number/format';
import type { Bench } from './use-bench';

/** A change that was not taken: who was faster, what is kept, and the ways on. */
export function ChangeProblem({ bench: { changing, mends, openPanel } }: { bench: Bench }) {
  const { problem, conflict } = changing;
  if (!problem) return null;
  const waiting = mends.unsent.size;
  const kept =
    waiting > 0
      ? `${counted(waiting, 'mend')} of yours ${waiting === 1 ? 'is' : 'are'} kept in the grid, not sent yet.`
      : 'What you typed is kept.';
  const reload = async () => {
    await changing.reload();
    openPanel('history');
  };
  return (
    <div className="change-problem">
      <ErrorState
        error={problem}
        kept={conflict ? `${kept} Nothing was overwritten.` : kept}
        actions={
          <>
            {conflict && (
              <Button size="small" appearance="primary" onClick={() => void reload()}>
                Reload to see what happened
              </Button>
            )}
            {waiting > 0 && (
              <Button size="small" onClick={() => void mends.resend()}>
                Send {waiting === 1 ? 'it' : 'them'} again
              </Button>
            )}
            {waiting > 0 && (
              <Button
                size="small"
                onClick={() => {
                  mends.drop();
                  changing.dismiss();
                }}
              >
                Give {waiting === 1 ? 'it' : 'them'} up
              </Button>
            )}
            {waiting === 0 && (
              <Button size="small" onClick={changing.dismiss}>
                Close
              </Button>
            )}
          </>
        }
      />
    </div>
  );
}
