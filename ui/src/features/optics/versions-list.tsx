import { Button } from '@fluentui/react-components';
import { Copy16Regular } from '@fluentui/react-icons';
import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { Figure } from '../../shared/figure/figure';
import { formatDate } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import '../../shared/table/table.css';
import { setVersionsQuery } from './queries';

const SHORT_CHECKSUM = 12;

/** Versions of a set, newest first, as estimates pin them. */
export function VersionsList({ slug }: { slug: string }) {
  const { data, error, refetch } = useQuery(setVersionsQuery(slug));
  const say = useSay();
  const copy = (number: number, checksum: string) =>
    navigator.clipboard.writeText(checksum).then(
      () => say('Checksum copied', `version ${number}`),
      () => say('The browser refused to copy', checksum, 'warning'),
    );
  return (
    <Figure
      plain
      title="Versions"
      sub="a published version never changes; estimates name theirs by its checksum"
    >
      {error && <ErrorState error={error} retry={() => void refetch()} />}
      {data && (
        <div className="optics-scroll" tabIndex={0} role="region" aria-label="Versions of this set">
          <table className="sl-table" aria-label="Versions">
            <thead>
              <tr>
                <th scope="col">Version</th>
                <th scope="col">State</th>
                <th scope="col">Date</th>
                <th scope="col">Checksum</th>
              </tr>
            </thead>
            <tbody>
              {data.toReversed().map(({ versionId, number, state, checksum, createdAt, publishedAt }) => (
                <tr key={versionId}>
                  <th scope="row">{number}</th>
                  <td>
                    <StateTag state={state} />
                  </td>
                  <td>
                    {publishedAt ? `published ${formatDate(publishedAt)}` : `begun ${formatDate(createdAt)}`}
                  </td>
                  <td>
                    <code title={checksum}>{checksum.slice(0, SHORT_CHECKSUM)}</code>{' '}
                    <Button
                      size="small"
                      appearance="transparent"
                      icon={<Copy16Regular />}
                      aria-label={`Copy the checksum of version ${number}`}
                      onClick={() => void copy(number, checksum)}
                    />
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </Figure>
  );
}
