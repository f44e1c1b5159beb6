import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';

export interface ConfirmDialogProps {
  title: string;
  /** What will happen, in plain words. */
  children: ReactNode;
  /** The deed in words: "Withdraw the application", never "OK". */
  confirmLabel: string;
  isOpen: boolean;
  isPending?: boolean;
  isDanger?: boolean;
  onConfirm: () => void;
  onCancel: () => void;
}

/** Asks once more before something that cannot easily be undone. */
export function ConfirmDialog({
  title,
  children,
  confirmLabel,
  isOpen,
  isPending = false,
  isDanger = false,
  onConfirm,
  onCancel,
}: ConfirmDialogProps) {
  return (
    <Dialog
      role="alertdialog"
      title={title}
      isOpen={isOpen}
      onOpenChange={(open) => {
        if (!open) onCancel();
      }}
    >
      <div className="grid gap-3">{children}</div>
      <div className="flex flex-wrap justify-end gap-3">
        <Button onPress={onCancel}>Leave it as it is</Button>
        <Button kind={isDanger ? 'danger' : 'primary'} isPending={isPending} onPress={onConfirm}>
          {confirmLabel}
        </Button>
      </div>
    </Dialog>
  );
}
