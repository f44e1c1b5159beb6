import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { Button } from '../../components/button.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { ProblemNotice } from '../../components/problem-notice.tsx';
import { isApiError } from '../../lib/api-error.ts';
import { NotFoundPage } from './not-found-page.tsx';

/** What is shown when a page itself breaks. */
export function ErrorPage() {
  const error = useRouteError();
  if (
    (isRouteErrorResponse(error) && error.status === 404) ||
    (isApiError(error) && error.status === 404)
  ) {
    return <NotFoundPage />;
  }
  return (
    <div className="sheet-width grid justify-items-start gap-4 py-10">
      <PageHeading>This page could not be shown</PageHeading>
      <ProblemNotice error={error} />
      <Button onPress={() => window.location.reload()}>Reload the page</Button>
    </div>
  );
}
