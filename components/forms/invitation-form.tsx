'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { PasswordInput } from '@/components/ui/password-input';
import { TextInput } from '@/components/ui/text-input';
import { send } from '@/lib/client/fetcher';
import { signInWith } from '@/lib/client/sign-in';
import { useAnswer } from '@/lib/client/use-answer';
import { invitationAcceptSchema, invitationPreviewSchema } from '@/lib/contracts/accounts';
import { ROLE_DEEDS, ROLE_NAMES } from '@/components/shell/role-words';
import { applyProblem } from './apply-problem';

/** What the invited person sees: who invites, as what, and the two things to fill in. Signs them in afterwards. */
export function InvitationForm({ token }: { token: string }) {
  const router = useRouter();
  const url = `/api/invitations/accept/${encodeURIComponent(token)}`;
  const { data: invitation, error: fault } = useAnswer(url, invitationPreviewSchema, { revalidateOnFocus: false });
  const form = useForm({ resolver: zodResolver(invitationAcceptSchema), defaultValues: { name: '', password: '' } });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;

  const submit = form.handleSubmit(async (request) => {
    if (!invitation) return;
    try {
      await send('POST', url, request);
    } catch (error) {
      applyProblem(form, error);
      return;
    }
    const outcome = await signInWith(invitation.email, request.password);
    // The account exists now either way; where signing in went wrong, the sign-in page says why.
    router.replace(outcome === 'signed in' ? '/projects' : '/sign-in');
    router.refresh();
  });

  if (fault) {
    const gone = fault.status === 404 || fault.status === 410;
    return (
      <div className="flex flex-col gap-4">
        <Notice tone="trouble" title={gone ? 'This invitation no longer works' : 'The invitation could not be read'}>
          {gone
            ? 'It has been used, withdrawn, or it is too old. Ask the person who invited you for a new one.'
            : fault.message}
        </Notice>
        <LinkButton href="/sign-in" className="self-end">
          Go to sign-in
        </LinkButton>
      </div>
    );
  }
  if (!invitation) return <LoadingLine label="Reading the invitation" />;

  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      <p>
        <strong className="font-semibold">{invitation.organisationName}</strong> invites you as{' '}
        <strong className="font-semibold">{ROLE_NAMES[invitation.role].toLowerCase()}</strong>:{' '}
        <span className="text-ink-soft">{ROLE_DEEDS[invitation.role]}</span>
      </p>
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <Field label="E-mail" hint="You will sign in with this address.">
        <TextInput type="email" autoComplete="username" value={invitation.email} readOnly />
      </Field>
      <Field label="Your name" hint="As colleagues and customers shall read it." error={errors.name?.message} required>
        <TextInput autoComplete="name" autoFocus {...form.register('name')} />
      </Field>
      <Field
        label="Password"
        hint="At least 10 characters; a short sentence is good."
        error={errors.password?.message}
        required
      >
        <PasswordInput autoComplete="new-password" {...form.register('password')} />
      </Field>
      <Button
        type="submit"
        variant="action"
        busy={isSubmitting || (isSubmitSuccessful && !errors.root)}
        busyLabel="Making the account…"
        className="mt-1 self-end"
      >
        Accept and sign in
      </Button>
    </form>
  );
}
