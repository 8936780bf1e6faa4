'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { applyProblem } from '@/components/forms/apply-problem';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextArea, TextInput } from '@/components/ui/text-input';
import { useGuest } from '@/lib/client/use-guest';
import { guestSchema, replyRequestSchema, type Guest } from '@/lib/contracts/remarks';

interface RemarkFormProps {
  /** Reads out what is written, such as `Your remark`. */
  readonly label: string;
  readonly sendLabel: string;
  readonly asGuest: boolean;
  /** Throws ProblemError; what was typed then stays. */
  readonly onSend: (body: string, guest: Guest | null) => Promise<void>;
  readonly onCancel?: () => void;
  readonly rows?: number;
  /** For those who came here by the keyboard; on a phone it would throw the screen keyboard over the drawing. */
  readonly takesFocus?: boolean;
}

const memberForm = replyRequestSchema;
const guestForm = z.object({ body: replyRequestSchema.shape.body, guest: guestSchema });

/** What somebody wants to say; a guest also says who they are, once a browser. */
export function RemarkForm({
  label,
  sendLabel,
  asGuest,
  onSend,
  onCancel,
  rows = 3,
  takesFocus = false,
}: RemarkFormProps) {
  const { guest, keepGuest } = useGuest();
  const form = useForm<{ body: string; guest?: Guest }>({
    resolver: zodResolver(asGuest ? guestForm : memberForm),
    defaultValues: asGuest ? { body: '', guest: guest ?? { name: '', email: '' } } : { body: '' },
  });
  const { errors, isSubmitting } = form.formState;
  const known = asGuest ? guest : null;
  const send = form.handleSubmit(async (values) => {
    try {
      const who = asGuest ? (values.guest ?? null) : null;
      await onSend(values.body, who);
      if (who) keepGuest(who);
      form.reset({ ...values, body: '' });
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <form onSubmit={send} noValidate className="grid gap-2.5">
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <Field label={label} error={errors.body?.message} required>
        <TextArea {...form.register('body')} rows={rows} maxLength={4000} autoFocus={takesFocus} />
      </Field>
      {asGuest && !known && (
        <div className="grid gap-2.5 sm:grid-cols-2">
          <Field label="Your name" error={errors.guest?.name?.message} required>
            <TextInput {...form.register('guest.name')} autoComplete="name" maxLength={120} />
          </Field>
          <Field
            label="Your e-mail address"
            error={errors.guest?.email?.message}
            hint="You get a mail when somebody answers."
            required
          >
            <TextInput {...form.register('guest.email')} type="email" inputMode="email" autoComplete="email" />
          </Field>
        </div>
      )}
      {known && (
        <p className="text-sm text-ink-soft">
          As {known.name}, {known.email}.{' '}
          <button
            type="button"
            className="text-petrol underline pointer-coarse:min-h-11"
            onClick={() => {
              form.setValue('guest', { name: '', email: '' });
              keepGuest(null);
            }}
          >
            Somebody else
          </button>
        </p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" variant="action" busy={isSubmitting} busyLabel="Sending…">
          {sendLabel}
        </Button>
        {onCancel && (
          <Button variant="quiet" onClick={onCancel}>
            Cancel
          </Button>
        )}
      </div>
    </form>
  );
}
