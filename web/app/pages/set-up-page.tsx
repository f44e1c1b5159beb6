import { Link } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { SetUpMunicipalityForm } from '../../features/places/components/set-up-municipality-form.tsx';
import { useSession } from '../../features/session/api/get-session.ts';
import { paths } from '../paths.ts';

/** What a server shows before anybody has said which place it serves. */
export function SetUpPage() {
  const session = useSession();
  return (
    <div className="sheet-width grid gap-6 py-10">
      <PageHeading>Which place is this?</PageHeading>
      <QueryView query={session} what="who is signed in">
        {({ person }) =>
          person?.role === 'administrator' ? (
            <SetUpMunicipalityForm />
          ) : (
            <p className="measure">
              This server has not been set up yet. Its administrator does that{' '}
              <Link to={paths.signIn.href()} className="link">
                after signing in
              </Link>
              .
            </p>
          )
        }
      </QueryView>
    </div>
  );
}
