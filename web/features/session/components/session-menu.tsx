import { Link, useNavigate } from 'react-router-dom';
import type { Person } from '../../../../shared/contracts/people.ts';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useDeleteSession } from '../api/delete-session.ts';

export interface SessionMenuProps {
  person: Person | null;
  isLoading: boolean;
}

/** Who is signed in, and the way in or out. */
export function SessionMenu({ person, isLoading }: SessionMenuProps) {
  const navigate = useNavigate();
  const showToast = useToast();
  const deleteSession = useDeleteSession();
  if (isLoading) return null;
  if (person === null) {
    return (
      <Link to={paths.signIn.href()} className="py-1 hover:underline">
        Sign in
      </Link>
    );
  }
  const handleSignOut = async () => {
    // First off the page: one that asks for an account would send the person to the sign-in.
    await navigate(paths.home.href());
    deleteSession.mutate(undefined, {
      onSuccess: () => showToast('You are signed out.'),
      onError: (error) => showToast(error.message),
    });
  };
  return (
    <span className="flex items-baseline gap-3 py-1">
      <span className="text-ink-soft">{person.name}</span>
      <Button kind="plain" isPending={deleteSession.isPending} onPress={() => void handleSignOut()}>
        Sign out
      </Button>
    </span>
  );
}
