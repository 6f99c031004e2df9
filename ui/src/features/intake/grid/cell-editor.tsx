import { useEffect, useRef, type KeyboardEvent } from 'react';

type Props = {
  row: number;
  column: { letter: string };
  start: string;
  onDone: (text: string | null, move: 'down' | 'right' | 'stay') => void;
};

/** Typing in a cell: Enter goes down, Tab to the right, Escape leaves the cell as it was. */
export function CellEditor({ row, column, start, onDone }: Props) {
  const input = useRef<HTMLInputElement>(null);
  const over = useRef(false);
  useEffect(() => {
    input.current?.focus();
    input.current?.setSelectionRange(start.length, start.length);
  }, [start]);
  const done = (text: string | null, move: 'down' | 'right' | 'stay') => {
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
      onBlur={(event) => done(event.currentTarget.value, 'stay')}
      onPaste={(event) => event.stopPropagation()}
      onMouseDown={(event) => event.stopPropagation()}
    />
  );
}
