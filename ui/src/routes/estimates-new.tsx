import { Button } from '@fluentui/react-components';
import { Play20Filled } from '@fluentui/react-icons';
import {
  useMutation,
  useQuery,
  useQueryClient,
  useSuspenseQuery,
  type QueryClient,
} from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { PreviewPane } from '../features/estimates/preview-pane';
import {
  backdropsQuery,
  estimatePreviewQuery,
  fieldsQuery,
  opticalSetsQuery,
  requestEstimate,
} from '../features/estimates/queries';
import { intoAddress, requestOf, setUpOf, type SetUp } from '../features/estimates/set-up';
import { SetUpFolds } from '../features/estimates/set-up-folds';
import { useSinceChange } from '../features/estimates/since-change';
import '../features/estimates/estimates.css';
import { toApiProblem } from '../shared/api/api-problem';
import { useHasRole } from '../shared/api/session';
import { EmptyState } from '../shared/feedback/empty-state';
import { ErrorState } from '../shared/feedback/error-state';
import { useSettled } from '../shared/form/use-settled';
import { Page } from '../shared/page/page';
import { useSliceOfPage } from '../shared/page/slice-of-page';
import { sliceWithin } from '../shared/page/slice-name';
import { StateTag } from '../shared/page/state-tag';

export const loader = (client: QueryClient) => () =>
  Promise.all([
    client.ensureQueryData(opticalSetsQuery),
    client.ensureQueryData(backdropsQuery),
    client.ensureQueryData(fieldsQuery(null)),
  ]);

const formFields = [
  'fieldVersionId',
  'opticalSetVersionId',
  'backdropVersionId',
  'transmittance',
  'longwave.efficiencyWm2',
  'shortwaveEfficiencyWm2',
  'members',
  'seed',
  'title',
];

/** Members and title change what is run, not what the preview shows. */
const previewed = (setUp: SetUp): SetUp => ({ ...setUp, members: 256, title: '' });

export default function NewEstimate() {
  const [params, setParams] = useSearchParams();
  const { data: sets } = useSuspenseQuery(opticalSetsQuery);
  const { data: backdrops } = useSuspenseQuery(backdropsQuery);
  const { data: fields } = useSuspenseQuery(fieldsQuery(null));
  const address = params.toString();
  const setUp = useMemo(() => setUpOf(new URLSearchParams(address)), [address]);
  const change = (part: Partial<SetUp>) =>
    setParams((before) => intoAddress(before, { ...setUpOf(before), ...part }), {
      replace: true,
      preventScrollReset: true,
    });
  useFirstChoices(setUp, { optics: sets[0]?.versionId, backdrop: backdrops[0]?.versionId }, change);

  const field = fields.find((one) => one.versionId === setUp.field);
  useSliceOfPage(field?.sliceSlug);
  const settled = useSettled(useMemo(() => previewed(setUp), [setUp]));
  const preview = useQuery(estimatePreviewQuery(useMemo(() => requestOf(settled), [settled])));
  const net = preview.data && !preview.isPlaceholderData ? preview.data.global.forcing.netWm2.value : null;
  const since = useSinceChange(settled, net);

  const client = useQueryClient();
  const navigate = useNavigate();
  const request = requestOf(setUp);
  const run = useMutation({
    mutationFn: () => {
      if (!request) throw new Error('A field, optics and ground have to be picked first.');
      return requestEstimate(request);
    },
    onSuccess: async ({ id }) => {
      await client.invalidateQueries({ queryKey: ['jobs'] });
      await navigate(`/estimates/${id}`);
    },
  });
  const isScientist = useHasRole('scientist');
  const fault = run.error ?? preview.error;
  return (
    <Page
      title={field ? `${field.sliceName} against ${sliceWithin(field.referenceName)}` : 'New estimate'}
      crumbs={[{ label: 'Estimates', to: '/estimates' }, { label: 'New estimate' }]}
      state={<StateTag state="draft" />}
      sub="kept in the address of this page"
      actions={
        <Button
          appearance="primary"
          icon={<Play20Filled />}
          disabled={!request || run.isPending || !isScientist}
          onClick={() => run.mutate()}
        >
          {run.isPending ? 'Asking' : `Run ${setUp.members} members`}
        </Button>
      }
    >
      {!isScientist ? (
        <EmptyState title="Estimates are run by scientists.">Those that exist are open to you.</EmptyState>
      ) : (
        <>
          {run.error && (
            <ErrorState error={run.error} kept="Your set-up is still here." fields={formFields} />
          )}
          <div className="set-up">
            <SetUpFolds
              {...{ setUp, fields, sets, backdrops }}
              problem={fault ? toApiProblem(fault) : null}
              onChange={change}
            />
            <PreviewPane
              result={preview.data}
              waiting={preview.isFetching}
              complete={request !== null}
              error={preview.error}
              since={since}
              onRetry={() => void preview.refetch()}
            />
          </div>
        </>
      )}
    </Page>
  );
}

/** The first optical set and backdrop stand chosen from the start; the field is the person's to pick. */
function useFirstChoices(
  setUp: SetUp,
  first: { optics?: string; backdrop?: string },
  change: (part: Partial<SetUp>) => void,
): void {
  useEffect(() => {
    const part: Partial<SetUp> = {};
    if (!setUp.optics && first.optics) part.optics = first.optics;
    if (!setUp.backdrop && first.backdrop) part.backdrop = first.backdrop;
    if (Object.keys(part).length > 0) change(part);
    // Only once, on arrival: a choice that is taken back later stays empty.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);
}
