import { isRouteErrorResponse, useRevalidator, useRouteError } from 'react-router-dom';
import { ApiProblem } from '../shared/api/api-problem';
import { ErrorState } from '../shared/feedback/error-state';
import NotFound from '../routes/not-found';

/** What stands in place of a page that could not be drawn; the frame round it stays usable. */
export function RouteError() {
  const error = useRouteError();
  const { revalidate } = useRevalidator();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFound />;
  if (error instanceof ApiProblem && error.status === 404) return <NotFound detail={error.detail} />;
  return (
    <>
      <h1 tabIndex={-1} className="page-fault">
        This page could not be shown
      </h1>
      <ErrorState
        error={error}
        kept="Nothing that was saved is lost."
        retry={() => retry(error, revalidate)}
      />
    </>
  );
}

/** A chunk of code that did not load needs the page anew; data that did not come is asked for again. */
function retry(error: unknown, revalidate: () => Promise<void>): void {
  if (error instanceof ApiProblem) void revalidate();
  else window.location.reload();
}
