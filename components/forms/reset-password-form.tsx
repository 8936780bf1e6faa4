'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { LinkButton, TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { PasswordInput } from '@/components/ui/password-input';
import { send, ProblemError } from '@/lib/client/fetcher';
import { passwordResetSchema } from '@/lib/contracts/accounts';
import { applyProblem } from './apply-problem';

/** Sets a new password with the token of the mail. A spent or old link says so and offers a new one. */
export function ResetPasswordForm({ token }: { token: string }) {
  const [stage, setStage] = useState<'asking' | 'done' | 'spent'>('asking');
  const form = useForm({ resolver: zodResolver(passwordResetSchema), defaultValues: { password: '' } });
  const { errors, isSubmitting } = form.formState;

  const submit = form.handleSubmit(async (request) => {
    try {
      await send('POST', `/api/account/password-reset/${encodeURIComponent(token)}`, request);
      setStage('done');
    } catch (error) {
      if (error instanceof ProblemError && (error.status === 404 || error.status === 410)) setStage('spent');
      else applyProblem(form, error);
    }
  });

  if (stage === 'done') {
    return (
      <div className="flex flex-col gap-4">
        <Notice tone="met" title="The new password is set">
          Every open session of this account has ended. Sign in with the new password.
        </Notice>
        <LinkButton href="/sign-in" variant="action" className="self-end">
          Sign in
        </LinkButton>
      </div>
    );
  }
  if (stage === 'spent') {
    return (
      <div className="flex flex-col gap-4">
        <Notice tone="trouble" title="This link no longer works">
          It has been used, or it is too old. Ask for a new one.
        </Notice>
        <LinkButton href="/forgotten-password" variant="action" className="self-end">
          Send a new mail
        </LinkButton>
      </div>
    );
  }
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <Field
        label="New password"
        hint="At least 10 characters; a short sentence is good."
        error={errors.password?.message}
        required
      >
        <PasswordInput autoComplete="new-password" autoFocus {...form.register('password')} />
      </Field>
      <div className="mt-1 flex flex-wrap items-center justify-between gap-3">
        <TextLink href="/sign-in" className="py-1.5 text-sm">
          Back to sign-in
        </TextLink>
        <Button type="submit" variant="action" busy={isSubmitting} busyLabel="Setting…">
          Set the password
        </Button>
      </div>
    </form>
  );
}
