import { Link } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { paths } from '../paths.ts';

export function ForbiddenPage() {
  return (
    <div className="sheet-width grid gap-3 py-10">
      <PageHeading>This page is not open to you</PageHeading>
      <p className="measure">
        Your account has no part in it. Sign in with the account that has, or go back to the{' '}
        <Link to={paths.home.href()} className="link">
          open cases
        </Link>
        .
      </p>
    </div>
  );
}
