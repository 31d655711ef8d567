import { X } from 'lucide-react';
import type { ReactNode } from 'react';
import { Dialog as AriaDialog, Heading, Modal, ModalOverlay } from 'react-aria-components';

/** A question or a list over the page; keeps the focus, gives it back, closes on Escape. */
export function Dialog({ title, isOpen, onClose, children, isDismissable = true }: { title: string; isOpen: boolean; onClose: () => void; children: ReactNode; isDismissable?: boolean }) {
  return (
    <ModalOverlay isOpen={isOpen} onOpenChange={(open) => !open && onClose()} isDismissable={isDismissable} className="fixed inset-0 z-40 grid place-items-center overflow-auto bg-[#17191a99] p-4">
      <Modal className="w-full max-w-xl bg-board outline-none">
        <AriaDialog className="grid gap-4 p-5 outline-none">
          <div className="rail-ends flex items-center">
            <Heading slot="title" className="text-gauge-s font-[640]">{title}</Heading>
            <button type="button" aria-label="Close" className="ml-auto flex min-h-11 min-w-11 items-center justify-center" onClick={onClose}><X size={20} aria-hidden="true" /></button>
          </div>
          {children}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
