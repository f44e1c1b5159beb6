import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';

/** Asks before work that is not saved is left behind. */
export function UnsavedGuard({ isUnsaved }: { isUnsaved: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      isUnsaved && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isUnsaved) return undefined;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isUnsaved]);
  return (
    <ConfirmDialog
      title="Leave without saving?"
      confirmLabel="Leave without saving"
      isOpen={blocker.state === 'blocked'}
      isDanger
      onConfirm={() => blocker.proceed?.()}
      onCancel={() => blocker.reset?.()}
    >
      <p>What you have changed since you last saved is lost.</p>
    </ConfirmDialog>
  );
}
