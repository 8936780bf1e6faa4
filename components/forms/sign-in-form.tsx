'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { PasswordInput } from '@/components/ui/password-input';
import { TextInput } from '@/components/ui/text-input';
import { signInWith } from '@/lib/client/sign-in';
import { emailSchema } from '@/lib/contracts/common';

const signInSchema = z.object({ email: emailSchema, password: z.string().min(1, 'Write your password.') });

const WORDS = {
  wrong: 'This e-mail address and password do not belong together. Check both, or set a new password.',
  'too many attempts': 'Too many tries with this address. Wait a quarter of an hour, or set a new password.',
  'no answer': 'The server did not answer. Check your connection and try again.',
};

/** E-mail and password; goes on to `returnTo`, a path that has been checked to be local. */
export function SignInForm({ returnTo }: { returnTo: string }) {
  const router = useRouter();
  const form = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email: '', password: '' } });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;

  const submit = form.handleSubmit(async ({ email, password }) => {
    const outcome = await signInWith(email, password);
    if (outcome === 'signed in') {
      router.replace(returnTo);
      router.refresh();
      return;
    }
    form.setError('root', { message: WORDS[outcome] });
    form.setFocus('password', { shouldSelect: true });
  });

  return (
    <form onSubmit={submit} noValidate method="post" className="flex flex-col gap-4">
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message} required>
        <TextInput type="email" autoComplete="username" inputMode="email" autoFocus {...form.register('email')} />
      </Field>
      <Field label="Password" error={errors.password?.message} required>
        <PasswordInput autoComplete="current-password" {...form.register('password')} />
      </Field>
      <div className="mt-1 flex flex-wrap items-center justify-between gap-3">
        <TextLink href="/forgotten-password" className="py-1.5 text-sm">
          Forgotten password
        </TextLink>
        <Button
          type="submit"
          variant="action"
          busy={isSubmitting || (isSubmitSuccessful && !errors.root)}
          busyLabel="Signing in…"
          className="min-w-28"
        >
          Sign in
        </Button>
      </div>
    </form>
  );
}
