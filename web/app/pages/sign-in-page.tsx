import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { useSession } from '../../features/session/api/get-session.ts';
import { SignInForm } from '../../features/session/components/sign-in-form.tsx';
import { homeOfRole, safeNext } from '../../features/session/home-of-role.ts';

export function SignInPage() {
  const navigate = useNavigate();
  const [searchParams] = useSearchParams();
  const session = useSession();
  const next = safeNext(searchParams.get('next'));
  const person = session.data?.person;
  if (person !== undefined && person !== null) {
    return <Navigate to={next ?? homeOfRole(person.role)} replace />;
  }
  return (
    <div className="sheet-width grid gap-6 py-10">
      <div className="grid gap-2">
        <PageHeading>Sign in</PageHeading>
        <p className="measure">
          For applicants, planning staff and members of the board. To read a case or to comment on
          it you need no account.
        </p>
      </div>
      <SignInForm
        onSignedIn={({ role }) => void navigate(next ?? homeOfRole(role), { replace: true })}
      />
      <p className="measure text-small text-ink-soft">
        Accounts are opened by the planning department. If you have none, or forgot the password,
        ask there.
      </p>
    </div>
  );
}
