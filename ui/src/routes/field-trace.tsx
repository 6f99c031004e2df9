import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import { fieldQuery } from '../features/fields/queries';
import { traceQuery } from '../features/trace/queries';
import { TraceWindow } from '../features/trace/trace-window';
import '../features/trace/trace.css';
import { Page } from '../shared/page/page';
import { useSliceOfPage } from '../shared/page/slice-of-page';

const wanted = (params: URLSearchParams) => [params.get('site') ?? '', params.get('dataset') ?? ''] as const;

export const loader =
  (client: QueryClient) =>
  ({ params, request }: LoaderFunctionArgs) =>
    Promise.all([
      client.ensureQueryData(fieldQuery(params.versionId!)),
      client.ensureQueryData(traceQuery(params.versionId!, ...wanted(new URL(request.url).searchParams))),
    ]);

export default function FieldTrace() {
  const { versionId = '' } = useParams();
  const [params] = useSearchParams();
  const { data: field } = useSuspenseQuery(fieldQuery(versionId));
  const { data: trace } = useSuspenseQuery(traceQuery(versionId, ...wanted(params)));
  useSliceOfPage(field.sliceSlug);
  const dataset = `/holdings/${trace.datasetSlug}/versions/${trace.versionNumber}`;
  return (
    <Page
      title={`${trace.site}: samples behind its fluxes`}
      crumbs={[
        { label: field.sliceName, to: `/slices/${field.sliceSlug}` },
        { label: field.title, to: `/fields/${versionId}` },
        { label: trace.site },
      ]}
      sub={trace.fileName}
    >
      <div className="trace">
        <p className="sl-13 sl-second">
          From <Link to={dataset}>{`${trace.datasetTitle}, version ${trace.versionNumber}`}</Link>, file{' '}
          {trace.fileName} as it was sent. Each cell opens in its sheet.{' '}
          <span className="sl-muted" title={trace.checksum}>
            SHA-256 {trace.checksum.slice(0, 12)}…
          </span>
        </p>
        {trace.windows.map((window) => (
          <TraceWindow key={window.sliceSlug} trace={trace} window={window} />
        ))}
      </div>
    </Page>
  );
}
