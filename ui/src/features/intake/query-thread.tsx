import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { formatAgo } from '../../shared/number/time';

type Query = SubmissionDetail['queries'][number];

/** A question and what was answered. */
export function QueryThread({ query }: { query: Query }) {
  return (
    <ol className="query-thread">
      {[query, ...query.replies].map((said, at) => (
        <li key={at}>
          <b className="query-who" title={said.by.name}>
            {said.by.initials}
          </b>
          {said.text} <span className="sl-small sl-muted">{formatAgo(said.at)}</span>
        </li>
      ))}
    </ol>
  );
}
