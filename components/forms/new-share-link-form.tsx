'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberInput } from '@/components/ui/number-input';
import { TextInput } from '@/components/ui/text-input';
import { useShareLinkActions } from '@/lib/client/use-share-links';
import { shareLinkRequestSchema } from '@/lib/contracts/share-links';
import { applyProblem } from './apply-problem';

/** For whom, for how long, and what they may do: look, remark, sign. */
export function NewShareLinkForm({ revisionId, onMade }: { revisionId: string; onMade: (address: string) => void }) {
  const { create } = useShareLinkActions(revisionId);
  const form = useForm({
    resolver: zodResolver(shareLinkRequestSchema),
    defaultValues: { label: '', mayRemark: true, maySign: false, expiresInDays: 30 },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (request) => {
    try {
      onMade((await create(request)).url);
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-3">
      <p className="text-ink-soft">Whoever has the link sees this revision, read-only, without an account.</p>
      {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
      <div className="grid gap-3 sm:grid-cols-[minmax(0,1fr)_9rem]">
        <Field
          label="For whom"
          hint="A note for yourselves; the customer does not see it."
          error={errors.label?.message}
        >
          <TextInput {...form.register('label')} autoComplete="off" />
        </Field>
        <Field label="Works for" error={errors.expiresInDays?.message}>
          <Controller
            control={form.control}
            name="expiresInDays"
            render={({ field }) => (
              <NumberInput
                ref={field.ref}
                value={field.value ?? null}
                onValueChange={field.onChange}
                unit="days"
                decimals={0}
                min={1}
                max={365}
              />
            )}
          />
        </Field>
      </div>
      <div className="flex flex-wrap items-center justify-between gap-3">
        <div className="grid gap-1.5">
          <Controller
            control={form.control}
            name="mayRemark"
            render={({ field }) => (
              <Checkbox checked={field.value ?? true} onCheckedChange={field.onChange} label="May pin remarks" />
            )}
          />
          <Controller
            control={form.control}
            name="maySign"
            render={({ field }) => (
              <Checkbox
                checked={field.value ?? false}
                onCheckedChange={field.onChange}
                label="May accept it or ask for changes"
              />
            )}
          />
        </div>
        <Button type="submit" variant="action" busy={isSubmitting} busyLabel="Making the link…">
          Make a link
        </Button>
      </div>
    </form>
  );
}
