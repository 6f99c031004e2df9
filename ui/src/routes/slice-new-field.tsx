import { Button } from '@fluentui/react-components';
import { Add20Regular } from '@fluentui/react-icons';
import {
  useMutation,
  useQuery,
  useQueryClient,
  useSuspenseQuery,
  type QueryClient,
} from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { FieldForm } from '../features/fields/field-form';
import { FieldReport } from '../features/fields/field-report';
import { fractionsMet } from '../features/fields/field-words';
import { buildField, datasetsQuery, fieldPreviewQuery, type FieldChoice } from '../features/fields/queries';
import { sliceQuery } from '../features/slices/queries';
import { toApiProblem } from '../shared/api/api-problem';
import { useHasRole } from '../shared/api/session';
import { EmptyState } from '../shared/feedback/empty-state';
import { ErrorState } from '../shared/feedback/error-state';
import { LoadingFigure } from '../shared/feedback/loading';
import { useSettled } from '../shared/form/use-settled';
import { Page } from '../shared/page/page';
import { sliceWithArticle, sliceWithin } from '../shared/page/slice-name';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    Promise.all([client.ensureQueryData(sliceQuery(params.slug!)), client.ensureQueryData(datasetsQuery)]);

const formFields = ['sizeCutoff', 'title', 'datasetVersionIds'];

export default function NewField() {
  const { slug = '' } = useParams();
  const { data: slice } = useSuspenseQuery(sliceQuery(slug));
  const { data: all } = useSuspenseQuery(datasetsQuery);
  const datasets = useMemo(
    () => all.filter(({ kind, latest }) => kind === 'dust-flux' && latest.state === 'published'),
    [all],
  );
  const [choice, setChoice] = useState<FieldChoice>(() => ({
    sliceSlug: slug,
    way: 'regional-scaling',
    datasetVersionIds: datasets.map(({ latest }) => latest.versionId),
  }));
  // A title changes nothing in the preview: it is left out, so that typing it asks for nothing.
  const settled = useSettled(useMemo(() => ({ ...choice, title: undefined }), [choice]));
  const preview = useQuery(fieldPreviewQuery(settled));
  const client = useQueryClient();
  const navigate = useNavigate();
  const build = useMutation({
    mutationFn: () => buildField(choice),
    onSuccess: async (field) => {
      await client.invalidateQueries({ queryKey: ['slices'] });
      await navigate(`/fields/${field.versionId}`);
    },
  });
  const mayBuild = useHasRole('scientist') && slice.reference !== null;
  const ready = mayBuild && choice.datasetVersionIds.length > 0 && !preview.isError;
  const crumbs = [
    { label: 'Slices', to: '/slices' },
    { label: slice.content.name, to: `/slices/${slug}` },
    { label: 'New field' },
  ];
  return (
    <Page
      title={`New field of ${sliceWithArticle(slice.content.name)}`}
      crumbs={crumbs}
      sub={slice.reference ? `against ${sliceWithin(slice.reference.name)}` : undefined}
      actions={
        <Button
          appearance="primary"
          icon={<Add20Regular />}
          disabled={!ready || build.isPending}
          onClick={() => build.mutate()}
        >
          {build.isPending ? 'Building' : 'Build field'}
        </Button>
      }
    >
      {!mayBuild ? (
        <EmptyState title="Fields are built by scientists, for slices with a reference.">
          This one can be looked at on its own page.
        </EmptyState>
      ) : (
        <div className="field-new">
          {build.error && (
            <ErrorState error={build.error} kept="Your choice is still here." fields={formFields} />
          )}
          <FieldForm
            choice={choice}
            datasets={datasets}
            fractions={preview.data ? fractionsMet(preview.data) : []}
            problem={build.error || preview.error ? toApiProblem(build.error ?? preview.error) : null}
            onChange={setChoice}
          />
          <section
            aria-label="Preview"
            aria-busy={preview.isFetching}
            className={
              preview.isFetching || preview.isPlaceholderData ? 'field-preview waiting' : 'field-preview'
            }
          >
            {preview.error && (
              <ErrorState
                error={preview.error}
                kept="Your choice is still here."
                retry={() => void preview.refetch()}
              />
            )}
            {preview.isLoading && choice.datasetVersionIds.length > 0 && <LoadingFigure height={420} />}
            {preview.data && !preview.error && <FieldReport field={preview.data} />}
          </section>
        </div>
      )}
    </Page>
  );
}
