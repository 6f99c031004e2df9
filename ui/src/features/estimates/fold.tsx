import { ChevronDown20Regular, ChevronRight20Regular } from '@fluentui/react-icons';
import { useId, type ReactNode } from 'react';

type Props = {
  number: number;
  question: string;
  sentence: ReactNode;
  source?: ReactNode;
  open: boolean;
  onToggle: () => void;
  children: ReactNode;
};

/** One question of a set-up: folded to a sentence, opened to its controls. */
export function Fold({ number, question, sentence, source, open, onToggle, children }: Props) {
  const body = useId();
  return (
    <section className={open ? 'fold open' : 'fold'} aria-label={question}>
      <button
        type="button"
        className="fold-head"
        aria-expanded={open}
        aria-controls={body}
        onClick={onToggle}
      >
        <span className="fold-number" aria-hidden="true">
          {number}
        </span>
        <span className="fold-text">
          <b>{question}</b>
          <span className="fold-say">{sentence}</span>
          {source && <small>{source}</small>}
        </span>
        {open ? <ChevronDown20Regular aria-hidden /> : <ChevronRight20Regular aria-hidden />}
      </button>
      <div id={body} className="fold-body" hidden={!open}>
        {open && children}
      </div>
    </section>
  );
}
