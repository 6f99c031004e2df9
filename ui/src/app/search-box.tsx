import { SearchBox as FluentSearchBox } from '@fluentui/react-components';
import type { SearchHit } from '@siltlight/common/wire/desk';
import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useDeferredValue, useEffect, useId, useRef, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { api } from '../shared/api/client';
import { listOf, type Listed } from '../shared/jobs/queries';

const searchFor = (text: string) => ({
  queryKey: ['search', text],
  queryFn: () => listOf(api.get<Listed<SearchHit>>('/search', { params: { q: text } })),
  enabled: text.length > 0,
  placeholderData: keepPreviousData,
});

/** Finds slices, datasets, sites, estimates; `/` goes to it, arrows choose, Enter opens. */
export function SearchBox({ focusFirst, onDone }: { focusFirst?: boolean; onDone?: () => void }) {
  const navigate = useNavigate();
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [text, setText] = useState('');
  const [at, setAt] = useState(0);
  const [open, setOpen] = useState(false);
  const wanted = useDeferredValue(text.trim());
  const { data: hits = [], isError, isFetching } = useQuery(searchFor(wanted));
  useSlashFocus(input, focusFirst);

  const close = () => {
    setOpen(false);
    onDone?.();
  };
  const go = (hit: SearchHit | undefined) => {
    if (!hit) return;
    setText('');
    close();
    void navigate(hit.path);
  };
  const keys = (event: KeyboardEvent) => {
    if (event.key === 'Escape') close();
    if (event.key === 'Enter') go(hits[at]);
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (!step || hits.length === 0) return;
    event.preventDefault();
    setAt((at + step + hits.length) % hits.length);
  };
  const shown = open && wanted.length > 0;
  return (
    <div className={onDone ? 'frame-search out' : 'frame-search'} role="search">
      <FluentSearchBox
        input={{
          ref: input,
          role: 'combobox',
          'aria-expanded': shown,
          'aria-controls': shown ? id : undefined,
          'aria-autocomplete': 'list',
          'aria-activedescendant': shown && hits[at] ? `${id}-${at}` : undefined,
        }}
        aria-label="Search slices, datasets, sites and estimates"
        placeholder="Slice, dataset, site, estimate"
        value={text}
        onChange={(_, data) => {
          setText(data.value);
          setAt(0);
          setOpen(true);
        }}
        onKeyDown={keys}
        onBlur={close}
      />
      {shown && (
        <div className="search-hits" onMouseDown={(event) => event.preventDefault()}>
          {isError && <p role="alert">The search did not come through. Type on to try again.</p>}
          {!isError && hits.length === 0 && (
            <p role="status">{isFetching ? 'Searching' : `Nothing is named “${wanted}”.`}</p>
          )}
          <ul role="listbox" id={id} aria-label="Found">
            {hits.map((hit, index) => (
              <li
                key={hit.path + hit.title}
                id={`${id}-${index}`}
                role="option"
                aria-selected={index === at}
                onClick={() => go(hit)}
              >
                <Marked text={hit.title} part={wanted} />
                <span>{hit.detail ? `${hit.kind}, ${hit.detail}` : hit.kind}</span>
              </li>
            ))}
          </ul>
        </div>
      )}
    </div>
  );
}

/** The found part of a name, marked by weight and a rule. */
function Marked({ text, part }: { text: string; part: string }) {
  const from = text.toLowerCase().indexOf(part.toLowerCase());
  if (from < 0) return <span>{text}</span>;
  return (
    <span>
      {text.slice(0, from)}
      <mark>{text.slice(from, from + part.length)}</mark>
      {text.slice(from + part.length)}
    </span>
  );
}

function useSlashFocus(input: React.RefObject<HTMLInputElement | null>, focusFirst?: boolean): void {
  useEffect(() => {
    if (focusFirst) input.current?.focus();
    const listen = (event: globalThis.KeyboardEvent) => {
      const typing =
        event.target instanceof HTMLElement && /^(INPUT|TEXTAREA|SELECT)$/.test(event.target.tagName);
      if (event.key !== '/' || typing || event.ctrlKey || event.metaKey) return;
      event.preventDefault();
      input.current?.focus();
    };
    window.addEventListener('keydown', listen);
    return () => window.removeEventListener('keydown', listen);
  }, [input, focusFirst]);
}
