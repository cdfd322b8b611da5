import { type ReactNode, useState } from 'react';
import { dialogTexts } from '../config/texts/furniture.js';
import { Button } from './button.js';
import { Dialog } from './dialog.js';
import { Text } from './text.js';

export interface ConfirmDialogProps {
  isOpen: boolean;
  onClose: () => void;
  /** Asks: "Throw the draft Mk 1.5 away?" */
  title: string;
  /** What will happen, and whether it can be undone. */
  children: ReactNode;
  /** The verb with its object: "Throw Mk 1.5 away". */
  confirmLabel: string;
  cancelLabel?: string;
  /** `stop` where something ends or is lost. */
  look?: 'ink' | 'stop';
  /** The dialog stays open, busy, until it is done; it closes on `true`. */
  onConfirm: () => Promise<boolean>;
}

/** Asks before something that cannot be taken back. */
export function ConfirmDialog({
  isOpen,
  onClose,
  title,
  children,
  confirmLabel,
  cancelLabel = dialogTexts.cancel,
  look = 'stop',
  onConfirm,
}: ConfirmDialogProps) {
  const [isBusy, setIsBusy] = useState(false);
  const confirm = async () => {
    setIsBusy(true);
    try {
      if (await onConfirm()) onClose();
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      isOpen={isOpen}
      onClose={onClose}
      title={title}
      actions={
        <>
          <Button look="outline" onClick={onClose} autoFocus>
            {cancelLabel}
          </Button>
          <Button look={look} onClick={confirm} isBusy={isBusy}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      {typeof children === 'string' ? <Text>{children}</Text> : children}
    </Dialog>
  );
}
