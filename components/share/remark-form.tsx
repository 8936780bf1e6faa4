'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { applyProblem } from '@/components/forms/apply-problem';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextArea, TextInput } from '@/components/ui/text-input';
import { useGuest } from '@/lib/client/use-guest';
import type { Said } from '@/lib/client/use-review';
import { guestSchema, replyRequestSchema, type Guest, type Person } from '@/lib/contracts/remarks';
import { PictureChoice } from './picture-choice';

interface RemarkFormProps {
  /** Reads out what is written, such as `Your remark`. */
  readonly label: string;
  readonly sendLabel: string;
  readonly asGuest: boolean;
  /** Throws ProblemError; what was typed then stays. */
  readonly onSend: (said: Said, guest: Guest | null, picture: File | null) => Promise<void>;
  /** Members who can be named with an @. */
  readonly people?: readonly Person[];
  readonly withPicture?: boolean;
  readonly onCancel?: () => void;
  readonly rows?: number;
  /** For those who came here by the keyboard; on a phone it would throw the screen keyboard over the drawing. */
  readonly takesFocus?: boolean;
}

const memberForm = replyRequestSchema.pick({ body: true });
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
  people = [],
  withPicture = false,
}: RemarkFormProps) {
  const { guest, keepGuest } = useGuest();
  const [picture, setPicture] = useState<File | null>(null);
  const form = useForm<{ body: string; guest?: Guest }>({
    resolver: zodResolver(asGuest ? guestForm : memberForm),
    defaultValues: asGuest ? { body: '', guest: guest ?? { name: '', email: '' } } : { body: '' },
  });
  const { errors, isSubmitting } = form.formState;
  const known = asGuest ? guest : null;
  const send = form.handleSubmit(async (values) => {
    try {
      const who = asGuest ? (values.guest ?? null) : null;
      const mentions = people.filter(({ name }) => values.body.includes(`@${name}`)).map(({ id }) => id);
      await onSend({ body: values.body, mentions }, who, picture);
      setPicture(null);
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
      {(withPicture || people.length > 0) && (
        <div className="flex flex-wrap items-center gap-2">
          {withPicture && <PictureChoice picture={picture} onChoose={setPicture} />}
          {people.length > 0 && (
            <Select
              aria-label="Name somebody"
              placeholder="@ Name somebody"
              value={undefined}
              onValueChange={(name) =>
                form.setValue('body', `${form.getValues('body')}@${name} `, { shouldDirty: true })
              }
              options={people.map(({ name }) => ({ value: name, label: name }))}
              className="w-auto!"
            />
          )}
        </div>
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
