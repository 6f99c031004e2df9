import { Button } from '@fluentui/react-components';
import { ArrowUndo16Regular } from '@fluentui/react-icons';
import { EmptyState } from '../../../shared/feedback/empty-state';
import { formatAgo } from '../../../shared/number/time';
import { undoCorrection } from '../changes';
import { addressOf } from '../places';
import type { Bench } from '../use-bench';

/** Cells typed over: what stood there, what stands there now, and the way back. */
export function MendsList({ bench: { detail, changing, go } }: { bench: Bench }) {
  const { corrections, rights } = detail;
  if (corrections.length === 0)
    return (
      <EmptyState title="Nothing is mended.">
        {rights.mayEdit
          ? 'Type over a cell to mend it; the text of the file is kept.'
          : 'The cells stand as they were sent.'}
      </EmptyState>
    );
  return (
    <ul className="drawer-list">
      {corrections.toReversed().map((mend) => (
        <li key={mend.id}>
          <p>
            <button type="button" className="finding-place" onClick={() => go(mend)}>
              {addressOf(mend)} of {mend.sheet}
            </button>
          </p>
          <p className="mend-change">
            <del>{mend.rawText || 'empty'}</del> <ins>{mend.text || 'empty'}</ins>
          </p>
          <p className="sl-small sl-muted">
            {mend.by.name}, {formatAgo(mend.at)}
          </p>
          {rights.mayEdit && (
            <Button
              size="small"
              icon={<ArrowUndo16Regular />}
              aria-label={`Undo the mend of ${addressOf(mend)}`}
              onClick={() => void changing.change(undoCorrection(mend.id))}
            >
              Undo
            </Button>
          )}
        </li>
      ))}
    </ul>
  );
}
