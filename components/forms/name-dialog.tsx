'use client';

import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';
import { sayError } from '@/lib/client/fetcher';

interface NameDialogProps {
  title: string;
  label: string;
  start: string;
  onClose: () => void;
  /** Throws when the server refuses. */
  onSubmit: (name: string) => Promise<void>;
}

/** Asks for one new name. Mount it to open it. */
export function NameDialog({ title, label, start, onClose, onSubmit }: NameDialogProps) {
  const [name, setName] = useState(start);
  const [fault, setFault] = useState<string>();
  const [busy, setBusy] = useState(false);

  const submit = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    const wanted = name.trim();
    if (!wanted) return setFault('Write a name.');
    setBusy(true);
    try {
      await onSubmit(wanted);
      onClose();
    } catch (error) {
      setFault(sayError(error));
      setBusy(false);
    }
  };

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={title}
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button type="submit" form="name-form" variant="action" busy={busy} busyLabel="Saving…">
            Save
          </Button>
        </>
      }
    >
      <form id="name-form" onSubmit={submit} noValidate>
        <Field label={label} error={fault} required>
          <TextInput
            value={name}
            maxLength={120}
            autoComplete="off"
            onChange={(event) => setName(event.target.value)}
            onFocus={(event) => event.target.select()}
          />
        </Field>
      </form>
    </Dialog>
  );
}
