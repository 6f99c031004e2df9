import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { formatDate } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import { pathOfVersion, shortSum } from './queries';

/** All versions, newest first, with what stands on the one shown. */
export function VersionsList({ detail }: { detail: DatasetVersionDetail }) {
  const { slug, version, versions, usedBy } = detail;
  const stale = usedBy.filter((one) => one.stale).length;
  return (
    <Figure plain title="Versions">
      <ol className="versions">
        {versions
          .toSorted((a, b) => b.number - a.number)
          .map((one) => (
            <li key={one.versionId} className={one.number === version.number ? 'current' : undefined}>
              <i aria-hidden="true" />
              <div>
                <p>
                  <b>
                    {one.number === version.number ? (
                      <span aria-current="page">{one.number}</span>
                    ) : (
                      <Link to={pathOfVersion(slug, one.number)} aria-label={`Version ${one.number}`}>
                        {one.number}
                      </Link>
                    )}
                  </b>
                  <span>{one.publishedAt ? formatDate(one.publishedAt) : 'not published'}</span>
                  <StateTag state={one.state} />
                </p>
                <p className="sl-small sl-muted" title={`sha-256 ${one.checksum}`}>
                  sha-256 {shortSum(one.checksum)}
                  {one.note && `; ${one.note}`}
                </p>
                {one.withdrawnReason && (
                  <p className="sl-small version-withdrawn">Withdrawn: {one.withdrawnReason}</p>
                )}
              </div>
            </li>
          ))}
      </ol>
      <div className="used-by">
        <b>Used by</b>
        {usedBy.length === 0 && <p className="sl-muted">nothing yet.</p>}
        <ul>
          {usedBy.map((one) => (
            <li key={one.id}>
              <Link to={`/${one.kind}s/${one.id}`}>{one.title}</Link>
              {one.stale && <StateTag state="stale" />}
            </li>
          ))}
        </ul>
        {stale > 0 && <p className="sl-muted">Those marked stand on a version that is no longer in force.</p>}
      </div>
    </Figure>
  );
}
