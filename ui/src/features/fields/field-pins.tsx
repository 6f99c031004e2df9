import type { FieldDetail } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { formatDateTime } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';

/** Exactly what the field rests on, each version by its number and checksum. */
export function FieldPins({ field }: { field: FieldDetail }) {
  return (
    <Figure plain title="Pins" sub="exactly these versions, kept for ever">
      <ul className="field-pins">
        <li>
          Slice <Link to={`/slices/${field.sliceSlug}`}>{field.sliceName}</Link> against{' '}
          <Link to={`/slices/${field.referenceSlug}`}>{field.referenceName}</Link>, size fraction{' '}
          <b>{field.sizeCutoff ?? 'not stated'}</b>
        </li>
        {field.datasetVersions.map((version) => (
          <li key={version.versionId}>
            <Link to={`/holdings/${version.slug}/versions/${version.number}`}>
              {version.title}, version {version.number}
            </Link>{' '}
            {version.state !== 'published' && <StateTag state={version.state} />}{' '}
            <span className="sl-muted" title={version.checksum}>
              SHA-256 {version.checksum.slice(0, 12)}…
            </span>
          </li>
        ))}
        <li>
          Base field: {field.baseField.title}. {field.baseField.source}
        </li>
        <li className="field-checksum">
          Checksum of this field, SHA-256: <span>{field.checksum}</span>
        </li>
        <li>
          Built by {field.createdBy.name}, {formatDateTime(field.createdAt)}
        </li>
      </ul>
    </Figure>
  );
}
