import type { ReactNode } from 'react';
import './feedback.css';

type Props = { title: string; children?: ReactNode; action?: ReactNode; after?: ReactNode };

/** Nothing here yet: one sentence that says what to do next, and the one action that does it. */
export function EmptyState({ title, children, action, after }: Props) {
  return (
    <div className="empty-state">
      <svg width="92" height="66" viewBox="0 0 92 66" aria-hidden="true">
        {[0, 1, 2, 3].map((bed) => (
          <path key={bed} d={`M6 ${10 + bed * 15}c14-5 24 4 40 1s26-7 40-2`} />
        ))}
      </svg>
      <b>{title}</b>
      {children && <p>{children}</p>}
      {action}
      {after && <p className="sl-small sl-muted">{after}</p>}
    </div>
  );
}
