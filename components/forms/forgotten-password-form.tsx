'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';
import { send } from '@/lib/client/fetcher';
import { passwordResetRequestSchema } from '@/lib/contracts/accounts';
import { applyProblem } from './apply-problem';

/** Asks for a mail with a link. The answer is the same whether or not the address is known. */
export function ForgottenPasswordForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(passwordResetRequestSchema), defaultValues: { email: '' } });
  const { errors, isSubmitting } = form.formState;

  const submit = form.handleSubmit(async (request) => {
    try {
      await send('POST', '/api/account/password-reset', request);
      setSentTo(request.email);
    } catch (error) {
      applyProblem(form, error);
    }
  });

  if (sentTo) {
    return (
      <div className="flex flex-col gap-4">
        <Notice tone="met" title="Look into your mailbox">
          If {sentTo} has an account here, a mail with a link is on its way. Nothing there after a few minutes? Look
          among the unwanted mail, or check the address.
        </Notice>
        <div className="flex flex-wrap items-center justify-between gap-3">
          <TextLink href="/sign-in" className="py-1.5 text-sm">
            Back to sign-in
          </TextLink>
          <Button variant="quiet" onClick={() => setSentTo(null)}>
            Use another address
          </Button>
        </div>
      </div>
    );
  }

  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      <p className="text-ink-soft">
        Write the address you sign in with. You get a mail with a link that sets a new password.
      </p>
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message} required>
        <TextInput type="email" autoComplete="username" inputMode="email" autoFocus {...form.register('email')} />
      </Field>
      <div className="mt-1 flex flex-wrap items-center justify-between gap-3">
        <TextLink href="/sign-in" className="py-1.5 text-sm">
          Back to sign-in
        </TextLink>
        <Button type="submit" variant="action" busy={isSubmitting} busyLabel="Sending…">
          Send the mail
        </Button>
      </div>
    </form>
  );
}
