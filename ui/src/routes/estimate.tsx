import { useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { EstimateActions } from '../features/estimates/estimate-actions';
import { EstimateReport } from '../features/estimates/estimate-report';
import { EstimateState } from '../features/estimates/estimate-state';
import { estimateQuery } from '../features/estimates/queries';
import { Running } from '../features/estimates/running';
import '../features/estimates/estimates.css';
import { ExportMenu } from '../features/exports/export-menu';
import { statusText, tracePath } from '../features/fields/field-words';
import { fieldQuery } from '../features/fields/queries';
import { ErrorState } from '../shared/feedback/error-state';
import { counted } from '../shared/number/format';
import { Page } from '../shared/page/page';
import { sliceWithin } from '../shared/page/slice-name';
import { useSliceOfPage } from '../shared/page/slice-of-page';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(estimateQuery(params.id!));

export default function Estimate() {
  const { id = '' } = useParams();
  const { data: estimate } = useSuspenseQuery(estimateQuery(id));
  const { result, request, state } = estimate;
  const field = useQuery({ ...fieldQuery(request.fieldVersionId), enabled: result !== null });
  useSliceOfPage(estimate.sliceSlug);
  const mayExport = state === 'published' || state === 'computed';
  const signOffFirst = state === 'computed' && estimate.rights.maySignOff;
  return (
    <Page
      title={`${estimate.sliceName} against ${sliceWithin(estimate.referenceName)}`}
      crumbs={[
        { label: 'Estimates', to: '/estimates' },
        { label: estimate.sliceName, to: `/estimates?slice=${estimate.sliceSlug}` },
        { label: `Run ${estimate.runNumber}` },
      ]}
      state={<EstimateState of={estimate} />}
      sub={`run ${estimate.runNumber}, ${counted(request.members, 'member')}`}
      actions={
        <EstimateActions
          estimate={estimate}
          exportMenu={
            mayExport && <ExportMenu estimateId={id} primary={!signOffFirst && state !== 'computed'} />
          }
        />
      }
    >
      {estimate.staleReason && (
        <p className="sl-13 sl-second">
          {estimate.staleReason} The numbers below stay as they were computed.
        </p>
      )}
      {state === 'computed' && !estimate.rights.maySignOff && estimate.rights.whyNot && (
        <p className="sl-13 sl-second">{estimate.rights.whyNot}</p>
      )}
      {field.isError && <ErrorState error={field.error} retry={() => void field.refetch()} />}
      {result ? (
        <EstimateReport
          estimate={estimate}
          result={result}
          sites={field.data?.sites ?? null}
          traceOf={(site) => tracePath(request.fieldVersionId, site)}
          statusText={statusText}
        />
      ) : (
        <Running estimate={estimate} />
      )}
    </Page>
  );
}
