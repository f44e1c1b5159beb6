import { useNavigate, useSearchParams } from 'react-router-dom';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { InvitationForm } from '../../features/session/components/invitation-form.tsx';
import { homeOfRole } from '../../features/session/home-of-role.ts';

/** Where a one-time link leads: name and password of a new account. */
export function InvitationPage() {
  const navigate = useNavigate();
  const [searchParams] = useSearchParams();
  const token = searchParams.get('token') ?? '';
  return (
    <div className="sheet-width grid gap-6 py-10">
      <PageHeading>Set up your account</PageHeading>
      {token === '' ? (
        <EmptyState title="This address is incomplete.">
          <p>Open the whole link that you were given; it works once.</p>
        </EmptyState>
      ) : (
        <InvitationForm
          token={token}
          onAccepted={({ role }) => void navigate(homeOfRole(role), { replace: true })}
        />
      )}
    </div>
  );
}
