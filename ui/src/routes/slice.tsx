import { Button } from '@fluentui/react-components';
import { Add20Regular } from '@fluentui/react-icons';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { FieldsTable } from '../features/slices/fields-table';
import { GasesFigure } from '../features/slices/gases-figure';
import { InsolationFigure } from '../features/slices/insolation-figure';
import { OrbitFigure } from '../features/slices/orbit-figure';
import { sliceQuery } from '../features/slices/queries';
import { Records } from '../features/slices/records';
import { SliceEstimates } from '../features/slices/slice-estimates';
import { orbitalAgeText, timesInWords, windowText } from '../features/slices/slice-words';
import '../features/slices/slices.css';
import { useHasRole } from '../shared/api/session';
import { Page } from '../shared/page/page';
import { sliceWithin } from '../shared/page/slice-name';
import { StateTag } from '../shared/page/state-tag';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(sliceQuery(params.slug!));

export default function Slice() {
  const { slug = '' } = useParams();
  const { data: slice } = useSuspenseQuery(sliceQuery(slug));
  const { content, reference } = slice;
  const navigate = useNavigate();
  const mayBuild = useHasRole('scientist') && reference !== null;
  const times = `${windowText(content)}, orbit at ${orbitalAgeText(content)}`;
  return (
    <Page
      title={content.name}
      crumbs={[{ label: 'Slices', to: '/slices' }, { label: content.name }]}
      state={<StateTag state={slice.state} />}
      sub={
        reference
          ? `${times}, against ${sliceWithin(reference.name)}`
          : `${times}, a reference for other slices`
      }
      actions={
        mayBuild && (
          <Button
            appearance="primary"
            icon={<Add20Regular />}
            onClick={() => void navigate(`/slices/${slug}/new-field`)}
          >
            Build a field
          </Button>
        )
      }
    >
      <p className="slice-times">
        {timesInWords(content)} {content.noteOnUse}
      </p>
      <div className="slice-top">
        <OrbitFigure slice={content} />
        {reference && <InsolationFigure slice={content} reference={reference} />}
        <GasesFigure slice={content} reference={reference} />
      </div>
      <Records records={slice.records} sliceName={content.name} />
      {reference && (
        <div className="slice-built">
          <FieldsTable
            fields={slice.fields}
            empty={
              <p className="sl-13 sl-muted">
                None yet.{mayBuild && ' “Build a field” above starts from the dataset versions in force.'}
              </p>
            }
          />
          <SliceEstimates estimates={slice.estimates} />
        </div>
      )}
      <p className="sl-small sl-muted slice-source">
        Definition: {content.source}. Version {slice.versionNumber}, SHA-256{' '}
        <span title={slice.checksum}>{slice.checksum.slice(0, 12)}…</span>
      </p>
    </Page>
  );
}
