import { Button } from '@fluentui/react-components';
import { Play20Regular } from '@fluentui/react-icons';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { FieldPins } from '../features/fields/field-pins';
import { FieldReport } from '../features/fields/field-report';
import { fieldQuery } from '../features/fields/queries';
import { useHasRole } from '../shared/api/session';
import { formatDate } from '../shared/number/time';
import { Page } from '../shared/page/page';
import { useSliceOfPage } from '../shared/page/slice-of-page';
import { StateTag } from '../shared/page/state-tag';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(fieldQuery(params.versionId!));

export default function FieldPage() {
  const { versionId = '' } = useParams();
  const { data: field } = useSuspenseQuery(fieldQuery(versionId));
  useSliceOfPage(field.sliceSlug);
  const navigate = useNavigate();
  const isScientist = useHasRole('scientist');
  return (
    <Page
      title={field.title}
      crumbs={[
        { label: 'Slices', to: '/slices' },
        { label: field.sliceName, to: `/slices/${field.sliceSlug}` },
        { label: 'Field' },
      ]}
      state={<StateTag state={field.stale ? 'stale' : field.state} />}
      sub={`built ${formatDate(field.createdAt)} by ${field.createdBy.name}`}
      actions={
        isScientist && (
          <Button
            appearance="primary"
            icon={<Play20Regular />}
            onClick={() => void navigate(`/estimates/new?field=${versionId}`)}
          >
            New estimate
          </Button>
        )
      }
    >
      {field.staleReason && (
        <p className="sl-13 sl-second">
          {field.staleReason} This field stays as it was; build a new one to take the change in.
        </p>
      )}
      <FieldReport field={field} />
      <FieldPins field={field} />
    </Page>
  );
}
