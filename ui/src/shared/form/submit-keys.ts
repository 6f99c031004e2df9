import type { KeyboardEvent } from 'react';

/** Ctrl+Enter (or Command+Enter) sends a form from any of its fields. */
export function submitOnCtrlEnter(event: KeyboardEvent<HTMLFormElement>): void {
  if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) {
    event.preventDefault();
    event.currentTarget.requestSubmit();
  }
}
