import { Link } from 'react-router-dom';
import { EmptyState } from '../shared/feedback/empty-state';
import { Page } from '../shared/page/page';

export default function NotFound({ detail }: { detail?: string }) {
  return (
    <Page title="There is nothing at this address">
      <EmptyState title="No such page, or you may not see it." action={<Link to="/desk">Go to the desk</Link>}>
        {detail ?? 'The link may be old, or the object was a draft that is gone. The search box finds what is here.'}
      </EmptyState>
    </Page>
  );
}
