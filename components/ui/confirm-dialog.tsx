'use client';

import { useState, type ReactNode } from 'react';
import { Button } from './button';
import { Dialog } from './dialog';
import { Notice } from './notice';

interface ConfirmDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  /** What happens, in plain words. */
  description: ReactNode;
  confirmLabel: string;
  /** Closes the dialog when it settles; a thrown error's message is shown and the dialog stays. */
  onConfirm: () => Promise<void> | void;
  danger?: boolean;
}

/** Asks before something that cannot simply be undone. */
export function ConfirmDialog({
  open,
  onOpenChange,
  title,
  description,
  confirmLabel,
  onConfirm,
  danger = false,
}: ConfirmDialogProps) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);

  const change = (next: boolean): void => {
    setFault(null);
    onOpenChange(next);
  };
  const confirm = async (): Promise<void> => {
    setBusy(true);
    setFault(null);
    try {
      await onConfirm();
      onOpenChange(false);
    } catch (error) {
      setFault(error instanceof Error ? error.message : 'That did not work. Try again.');
    } finally {
      setBusy(false);
    }
  };

  return (
    <Dialog
      open={open}
      onOpenChange={change}
      title={title}
      description={description}
      footer={
        <>
          <Button variant="quiet" onClick={() => change(false)}>
            Cancel
          </Button>
          <Button variant={danger ? 'danger' : 'action'} busy={busy} onClick={confirm}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      {fault && <Notice tone="trouble">{fault}</Notice>}
    </Dialog>
  );
}
