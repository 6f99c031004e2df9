import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { opticalSetQuery } from '../features/optics/queries';
import { Workbench } from '../features/optics/workbench';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(opticalSetQuery(params.slug!));

export default function OpticsSet() {
  const { slug = '' } = useParams();
  const { data: set } = useSuspenseQuery(opticalSetQuery(slug));
  return <Workbench key={slug} set={set} />;
}
