import { useEffect, type ReactNode } from 'react';
import { WordMark } from '../../shared/page/word-mark';
import { StrataMotif } from './strata-motif';
import './gate.css';

/** The page before sign-in: the motif, and one form beside it. */
export function Gate({ title, lead, children }: { title: string; lead: string; children: ReactNode }) {
  useEffect(() => {
    document.title = `${title} · Siltlight`;
  }, [title]);
  return (
    <div className="gate">
      <div className="gate-motif">
        <StrataMotif />
      </div>
      <main>
        <div className="gate-form">
          <div className="gate-brand">
            <WordMark sizePx={40} />
            <span>Siltlight</span>
          </div>
          <p className="gate-tag">{lead}</p>
          <h1>{title}</h1>
          {children}
        </div>
      </main>
    </div>
  );
}
