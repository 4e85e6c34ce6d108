import type { ReactNode } from 'react';
import { Dialog as AriaDialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { Button } from './Button';
import { classes } from './classes';

export interface DialogProps {
  title: string;
  isOpen: boolean;
  onClose: () => void;
  children: ReactNode;
  /** Buttons at the foot, least destructive first. */
  actions?: ReactNode;
  wide?: boolean;
  /** `alertdialog` for a question that must be answered. */
  role?: 'dialog' | 'alertdialog';
  /** One of the actions has to be chosen: no cross, no Esc. */
  mustAnswer?: boolean;
}

/** A modal dialog: focus goes in and comes back, Esc and a visible button close it. */
export function Dialog({ title, isOpen, onClose, children, actions, wide = false, role = 'dialog', mustAnswer = false }: DialogProps) {
  return (
    <ModalOverlay
      isOpen={isOpen}
      onOpenChange={(open) => !open && onClose()}
      isDismissable={role === 'dialog'}
      isKeyboardDismissDisabled={mustAnswer}
      className="backdrop"
    >
      <Modal className={classes('dialog', wide && 'dialog-wide')}>
        <AriaDialog role={role} className="outline-none">
          <div className="mb-3 flex items-baseline gap-3">
            <Heading slot="title" level={2}>
              {title}
            </Heading>
            {!mustAnswer && (
              <Button variant="quiet" size="small" icon aria-label="Close" className="ml-auto" onPress={onClose}>
                ×
              </Button>
            )}
          </div>
          {children}
          {actions && <div className="mt-4 flex flex-wrap justify-end gap-2">{actions}</div>}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
