import { Link } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { paths } from '../paths.ts';

export function NotFoundPage() {
  return (
    <div className="sheet-width grid gap-3 py-10">
      <PageHeading>There is nothing at this address</PageHeading>
      <p className="measure">
        The link may be old or mistyped, or the case is not open to the public yet. Look for it by
        address or case number among the{' '}
        <Link to={paths.home.href()} className="link">
          open cases
        </Link>
        .
      </p>
    </div>
  );
}
