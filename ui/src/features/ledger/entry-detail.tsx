import type { LedgerEntryView } from '@siltlight/common/wire/ledger';
import { formatDateTime } from '../../shared/number/time';
import './ledger.css';

const shown = (value: unknown) =>
  value === null || value === undefined ? 'nothing' : JSON.stringify(value, null, 2);

/** One act with what stood before and after, and its place in the chain. */
export function EntryDetail({ entry }: { entry: LedgerEntryView }) {
  return (
    <section className="ledger-detail" aria-label={`Row ${entry.position}`}>
      <h2>{entry.summary}</h2>
      <p className="sl-small sl-muted">
        Row {entry.position}, {formatDateTime(entry.at)}, {entry.actor?.name ?? 'the service'}, {entry.verb},{' '}
        {entry.objectKind}
      </p>
      <h3>Before</h3>
      <pre tabIndex={0}>{shown(entry.before)}</pre>
      <h3>After</h3>
      <pre tabIndex={0}>{shown(entry.after)}</pre>
      <p className="sl-small sl-muted ledger-hash">SHA-256 {entry.hash}</p>
    </section>
  );
}
