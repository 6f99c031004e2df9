import { Button, Textarea } from '@fluentui/react-components';
import { Comment16Filled, Dismiss16Regular } from '@fluentui/react-icons';
import { useState, type FormEvent } from 'react';
import { submitOnCtrlEnter } from '../../shared/form/submit-keys';
import { pinQuery, reply, type CellPlace } from './changes';
import { addressOf } from './places';
import { QueryThread } from './query-thread';
import type { Bench } from './use-bench';

const SHORTEST = 3;

/** Beneath its cell: the query, its answers, and a place to write. */
export function QueryBox({ bench, place }: { bench: Bench; place: CellPlace }) {
  const { detail, changing, openQuery, go } = bench;
  const [text, setText] = useState('');
  const query = detail.queries.find(
    (one) => one.sheet === place.sheet && one.row === place.row && one.column === place.column,
  );
  const mayWrite = query ? detail.rights.mayEdit || detail.rights.mayDecide : detail.rights.mayDecide;
  const ready = text.trim().length >= (query ? 1 : SHORTEST);
  const close = () => {
    openQuery(null);
    go(place);
  };
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    if (!ready) return;
    if (await changing.change(query ? reply(query.id, text.trim()) : pinQuery(place, text.trim())))
      setText('');
  };
  return (
    <form
      className="query-box"
      role="dialog"
      aria-label={`Query on ${addressOf(place)}`}
      onSubmit={(event) => void submit(event)}
      onKeyDown={(event) => {
        if (event.key === 'Escape') close();
        submitOnCtrlEnter(event);
      }}
    >
      <header>
        <Comment16Filled aria-hidden />
        <b>Query on {addressOf(place)}</b>
        <span className="sl-small sl-muted">to {detail.contributor.initials}</span>
        <span className="sl-grow" />
        <Button
          size="small"
          appearance="subtle"
          aria-label="Close the query"
          icon={<Dismiss16Regular />}
          onClick={close}
        />
      </header>
      {query && <QueryThread query={query} />}
      {mayWrite && (
        <>
          <Textarea
            autoFocus
            size="small"
            rows={2}
            resize="none"
            maxLength={4000}
            aria-label={query ? 'Your answer' : 'Your question'}
            value={text}
            onChange={(_, data) => setText(data.value)}
          />
          <footer>
            <span className="sl-small sl-muted">
              {query ? 'They are told by mail' : 'Sent at once, by mail too'}
            </span>
            <span className="sl-grow" />
            <Button type="submit" size="small" appearance="primary" disabled={!ready || changing.busy}>
              {query ? 'Answer' : 'Pin'}
            </Button>
          </footer>
        </>
      )}
    </form>
  );
}
