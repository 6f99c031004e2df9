import { EmptyState } from '../../../shared/feedback/empty-state';
import { addressOf } from '../places';
import { QueryThread } from '../query-thread';
import type { Bench } from '../use-bench';

/** Questions pinned to cells, with their answers. */
export function QueriesList({ bench }: { bench: Bench }) {
  const { detail, go, openQuery } = bench;
  if (detail.queries.length === 0)
    return (
      <EmptyState title="No query is open.">
        {detail.rights.mayDecide
          ? 'Pick a cell and press Query beneath the grid to ask about it.'
          : 'When a steward asks about a cell, the question stands here and at the cell.'}
      </EmptyState>
    );
  return (
    <ul className="drawer-list">
      {detail.queries.map((query) => (
        <li key={query.id}>
          <p>
            <button
              type="button"
              className="finding-place"
              onClick={() => {
                go(query);
                openQuery(query);
              }}
            >
              {addressOf(query)} of {query.sheet}
            </button>
          </p>
          <QueryThread query={query} />
        </li>
      ))}
    </ul>
  );
}
