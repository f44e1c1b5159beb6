import { Navigate, Outlet, useLocation } from 'react-router-dom';
import type { Role } from '../../../shared/contracts/people.ts';
import { QueryView } from '../../components/query-view.tsx';
import { useSession } from '../../features/session/api/get-session.ts';
import { ForbiddenPage } from '../pages/forbidden-page.tsx';
import { paths } from '../paths.ts';

/** Pages for some roles only. The server refuses the data as well; this spares people an error. */
export function RequireRole({ roles }: { roles: readonly Role[] }) {
  const session = useSession();
  const { pathname, search } = useLocation();
  return (
    <QueryView query={session} what="who is signed in">
      {({ person }) => {
        if (person === null) {
          return <Navigate to={paths.signIn.href({ next: `${pathname}${search}` })} replace />;
        }
        return roles.includes(person.role) ? <Outlet /> : <ForbiddenPage />;
      }}
    </QueryView>
  );
}
