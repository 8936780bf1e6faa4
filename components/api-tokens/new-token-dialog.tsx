'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { Check, Copy } from 'lucide-react';
import { useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { applyProblem } from '@/components/forms/apply-problem';
import { ROLE_DEEDS, ROLE_NAMES, ROLES_IN_ORDER } from '@/components/shell/role-words';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { useAccount } from '@/lib/client/account-context';
import { useApiTokenActions } from '@/lib/client/use-api-tokens';
import { apiTokenRequestSchema, type NewApiToken } from '@/lib/contracts/api-tokens';

const ORDER = ['viewer', 'planner', 'integrator', 'admin'] as const;
const DAYS = ['7', '30', '90', '365'] as const;

/** Makes a token and shows it, this once. Mount it to open it. */
export function NewTokenDialog({ onClose }: { readonly onClose: () => void }) {
  const { role: ownRole } = useAccount();
  const { create } = useApiTokenActions();
  const [made, setMade] = useState<NewApiToken | null>(null);
  const form = useForm({
    resolver: zodResolver(apiTokenRequestSchema),
    defaultValues: { name: '', role: ownRole, readOnly: true, expiresInDays: 90 },
  });
  const { errors, isSubmitting } = form.formState;
  const allowed = ROLES_IN_ORDER.filter((role) => ORDER.indexOf(role) <= ORDER.indexOf(ownRole));
  const submit = form.handleSubmit(async (request) => {
    try {
      setMade(await create(request));
    } catch (error) {
      applyProblem(form, error);
    }
  });
  if (made) return <MadeToken token={made} onClose={onClose} />;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="New API token"
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button type="submit" form="token-form" variant="action" busy={isSubmitting} busyLabel="Making it…">
            Make the token
          </Button>
        </>
      }
    >
      <form id="token-form" onSubmit={submit} noValidate className="flex flex-col gap-4">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        <Field label="What it is for" error={errors.name?.message} required>
          <TextInput autoComplete="off" placeholder="Nightly export" {...form.register('name')} />
        </Field>
        <Controller
          control={form.control}
          name="role"
          render={({ field }) => (
            <Field
              label="Acts as"
              hint={`A ${ROLE_NAMES[field.value].toLowerCase()} ${ROLE_DEEDS[field.value]}`}
              error={errors.role?.message}
            >
              <Select
                value={field.value}
                onValueChange={field.onChange}
                options={allowed.map((value) => ({ value, label: ROLE_NAMES[value] }))}
              />
            </Field>
          )}
        />
        <Controller
          control={form.control}
          name="readOnly"
          render={({ field }) => (
            <Checkbox
              checked={field.value ?? true}
              onCheckedChange={field.onChange}
              label="Read only"
              hint="It may fetch, but change nothing."
            />
          )}
        />
        <Controller
          control={form.control}
          name="expiresInDays"
          render={({ field }) => (
            <Field label="Valid for" error={errors.expiresInDays?.message}>
              <Select
                value={String(field.value ?? 90) as (typeof DAYS)[number]}
                onValueChange={(days) => field.onChange(Number(days))}
                options={DAYS.map((days) => ({ value: days, label: `${days} days` }))}
              />
            </Field>
          )}
        />
      </form>
    </Dialog>
  );
}

function MadeToken({ token, onClose }: { readonly token: NewApiToken; readonly onClose: () => void }) {
  const [copied, setCopied] = useState<'yes' | 'refused' | null>(null);
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(token.token);
      setCopied('yes');
    } catch {
      // Browsers refuse the clipboard outside https and without permission.
      setCopied('refused');
    }
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="The token is ready"
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            I have copied it
          </Button>
          <Button variant="action" onClick={() => void copy()} aria-live="polite">
            {copied === 'yes' ? <Check aria-hidden className="size-4" /> : <Copy aria-hidden className="size-4" />}
            {copied === 'yes' ? 'Copied' : 'Copy the token'}
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-3">
        <Notice tone="met">
          Copy it now: it is shown this once only, and we keep no copy. Whoever has it can do what it may do.
        </Notice>
        <Field
          label="Token"
          hint={copied === 'refused' ? 'The browser did not let us copy. Select it and copy it by hand.' : undefined}
        >
          <TextInput
            readOnly
            value={token.token}
            className="font-mono text-sm"
            onFocus={(event) => event.target.select()}
          />
        </Field>
      </div>
    </Dialog>
  );
}
