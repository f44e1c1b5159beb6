import type { ReactNode } from 'react';
import { Dialog as AriaDialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';

export interface DialogProps {
  title: string;
  isOpen: boolean;
  onOpenChange: (isOpen: boolean) => void;
  children: ReactNode;
  /** An alert interrupts and asks for a decision. */
  role?: 'dialog' | 'alertdialog';
}

/** A sheet laid over the page; Escape and a click outside put it away. */
export function Dialog({ title, isOpen, onOpenChange, children, role = 'dialog' }: DialogProps) {
  return (
    <ModalOverlay
      isOpen={isOpen}
      onOpenChange={onOpenChange}
      isDismissable={role === 'dialog'}
      className="fixed inset-0 z-20 flex items-start justify-center overflow-y-auto bg-ink/40 p-4 sm:items-center"
    >
      <Modal className="w-full max-w-xl border border-ink bg-paper">
        <AriaDialog role={role} className="grid gap-4 p-5 outline-none sm:p-6">
          <Heading slot="title" className="text-heading font-strong">
            {title}
          </Heading>
          {children}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
