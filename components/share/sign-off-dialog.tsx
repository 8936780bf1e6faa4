'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { applyProblem } from '@/components/forms/apply-problem';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextArea, TextInput } from '@/components/ui/text-input';
import { useGuest } from '@/lib/client/use-guest';
import type { SignOffs } from '@/lib/client/use-sign-offs';
import { guestSchema, type Guest } from '@/lib/contracts/remarks';
import { signOffRequestSchema, type SignOffDecision } from '@/lib/contracts/sign-offs';

interface SignOffDialogProps {
  readonly decision: SignOffDecision;
  readonly number: number;
  readonly sha256: string;
  readonly asGuest: boolean;
  readonly sign: SignOffs['sign'];
  readonly onClose: () => void;
}

const note = signOffRequestSchema.shape.note;
const memberForm = z.object({ note });
const guestForm = z.object({ note, guest: guestSchema });

/** Says what is about to be signed, asks a guest who they are, and signs. Mount it to open it. */
export function SignOffDialog({ decision, number, sha256, asGuest, sign, onClose }: SignOffDialogProps) {
  const { guest, keepGuest } = useGuest();
  const form = useForm<{ note?: string; guest?: Guest }>({
    resolver: zodResolver(asGuest ? guestForm : memberForm),
    defaultValues: asGuest ? { note: '', guest: guest ?? { name: '', email: '' } } : { note: '' },
  });
  const { errors, isSubmitting } = form.formState;
  const accepts = decision === 'accepted';
  const submit = form.handleSubmit(async (values) => {
    try {
      const who = asGuest ? (values.guest ?? null) : null;
      await sign({ decision, sha256, note: values.note ?? '' }, who);
      if (who) keepGuest(who);
      onClose();
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={accepts ? `Accept revision ${number}` : `Ask for changes to revision ${number}`}
      description={
        accepts
          ? 'You say that the cell may be built as drawn here. The revision, your name and the time are kept, and never change.'
          : 'The revision stays as it is, and the integrator is told to draw a new one. Remarks that you have pinned stay with it.'
      }
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button variant="action" busy={isSubmitting} busyLabel="Signing" onClick={() => void submit()}>
            {accepts ? 'Sign and accept' : 'Send'}
          </Button>
        </>
      }
    >
      <form onSubmit={submit} noValidate className="grid gap-3">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        {asGuest && (
          <div className="grid gap-3 sm:grid-cols-2">
            <Field label="Your name" error={errors.guest?.name?.message} required>
              <TextInput {...form.register('guest.name')} autoComplete="name" maxLength={120} />
            </Field>
            <Field label="Your e-mail address" hint="You get a receipt." error={errors.guest?.email?.message} required>
              <TextInput {...form.register('guest.email')} type="email" inputMode="email" autoComplete="email" />
            </Field>
          </div>
        )}
        <Field label={accepts ? 'A word with it' : 'What has to change'} error={errors.note?.message}>
          <TextArea {...form.register('note')} rows={3} maxLength={4000} />
        </Field>
        <p className="text-sm text-ink-soft">
          Content signed, SHA-256: <span className="font-mono break-all">{sha256}</span>
        </p>
        {accepts && (
          <p className="text-sm text-ink-soft">
            These are planning figures. Accepting them replaces no risk assessment and no measured stopping time.
          </p>
        )}
      </form>
    </Dialog>
  );
}
