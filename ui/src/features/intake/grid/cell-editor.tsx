import { useEffect, useRef, type KeyboardEvent } from 'react';

/** Where the keyboard goes after typing; 'away': it has gone elsewhere already. */
export type EditorMove = 'down' | 'right' | 'stay' | 'away';

type Props = {
  row: number;
  column: { letter: string };
  start: string;
  /** a proposal: only a key or a change takes it, not a look elsewhere */
  tentative: boolean;
  onDone: (text: string | null, move: EditorMove) => void;
};

/** Typing in a cell: Enter goes down, Tab to the right, Escape leaves the cell as it was. */
export function CellEditor({ row, column, start, tentative, onDone }: Props) {
  const input = useRef<HTMLInputElement>(null);
  const over = useRef(false);
  useEffect(() => {
    input.current?.focus();
    input.current?.setSelectionRange(start.length, start.length);
  }, [start]);
  const done = (text: string | null, move: EditorMove) => {
    if (over.current) return;
    over.current = true; // leaving the field after Enter must not send twice
    onDone(text, move);
  };
  const keys = (event: KeyboardEvent<HTMLInputElement>) => {
    event.stopPropagation();
    if (event.key === 'Enter' || event.key === 'Tab') {
      event.preventDefault();
      done(event.currentTarget.value, event.key === 'Enter' ? 'down' : 'right');
    } else if (event.key === 'Escape') {
      event.preventDefault();
      done(null, 'stay');
    }
  };
  return (
    <input
      ref={input}
      className="cell-editor"
      aria-label={`${column.letter}${row}`}
      defaultValue={start}
      onKeyDown={keys}
      onBlur={({ currentTarget: { value } }) => done(tentative && value === start ? null : value, 'away')}
      onPaste={(event) => event.stopPropagation()}
      onMouseDown={(event) => event.stopPropagation()}
    />
  );
}
