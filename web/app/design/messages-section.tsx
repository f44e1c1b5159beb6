import { useState } from 'react';
import { Button } from '../../components/button.tsx';
import { ConfirmDialog } from '../../components/confirm-dialog.tsx';
import { Dialog } from '../../components/dialog.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { Loading } from '../../components/loading.tsx';
import { ProblemNotice } from '../../components/problem-notice.tsx';
import { useToast } from '../../components/toast.tsx';
import { ApiError } from '../../lib/api-error.ts';
import { DesignSection, Specimen } from './design-section.tsx';

const mendable = new ApiError({
  type: 'about:blank',
  title: 'The massing cannot be stored like this.',
  status: 422,
  code: 'INPUT_INVALID',
  detail: 'Two things stand in the way.',
  errors: [
    { path: 'upper.base', message: 'The block “upper” begins above its own top: swap the two.' },
    { path: 'lower', message: 'The block “lower” leaves the site by 1.2 m at its east corner.' },
  ],
});

const serverFault = new ApiError({
  type: 'about:blank',
  title: 'The server could not answer. Try again in a moment.',
  status: 500,
  code: 'INTERNAL',
  requestId: 'b2f1c7',
});

type OpenDialog = 'dialog' | 'confirm' | 'danger';

export function MessagesSection() {
  const [open, setOpen] = useState<OpenDialog | null>(null);
  const showToast = useToast();
  const close = () => setOpen(null);
  return (
    <DesignSection title="Dialogs and messages">
      <div className="flex flex-wrap gap-4">
        <Button onPress={() => setOpen('dialog')}>Open a dialog</Button>
        <Button onPress={() => setOpen('confirm')}>Ask once more</Button>
        <Button kind="danger" onPress={() => setOpen('danger')}>
          Ask before harm
        </Button>
        <Button onPress={() => showToast('The comment is published.')}>Show a short message</Button>
      </div>
      <Dialog title="Send the link" isOpen={open === 'dialog'} onOpenChange={close}>
        <p>It leads to this day, this hour and this receptor.</p>
        <Button kind="primary" className="justify-self-end" onPress={close}>
          Close
        </Button>
      </Dialog>
      <ConfirmDialog
        title="Publish the case?"
        confirmLabel="Publish and open for comment"
        isOpen={open === 'confirm'}
        onConfirm={close}
        onCancel={close}
      >
        <p>Everybody can read it from then on.</p>
      </ConfirmDialog>
      <ConfirmDialog
        title="Withdraw the application?"
        confirmLabel="Withdraw the application"
        isDanger
        isOpen={open === 'danger'}
        onConfirm={close}
        onCancel={close}
      >
        <p>It ends here; a new one must be started from the beginning.</p>
      </ConfirmDialog>
      <div className="grid gap-6 md:grid-cols-2">
        <Specimen name="nothing there yet">
          <EmptyState title="No study has been run yet.">
            <p>It computes the shadows of every hour of the four key dates.</p>
            <Button kind="primary">Run the study</Button>
          </EmptyState>
        </Specimen>
        <Specimen name="being loaded">
          <Loading what="the study" />
        </Specimen>
        <Specimen name="what a person can mend">
          <ProblemNotice error={mendable} />
        </Specimen>
        <Specimen name="what only the server can mend">
          <ProblemNotice error={serverFault} onRetry={() => undefined} />
        </Specimen>
      </div>
    </DesignSection>
  );
}
