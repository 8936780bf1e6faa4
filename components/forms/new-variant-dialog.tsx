'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { layoutRequestSchema, type LayoutSummary } from '@/lib/contracts/layouts';
import { applyProblem } from './apply-problem';

interface NewVariantDialogProps {
  layouts: readonly LayoutSummary[];
  /** The variant it starts as a copy of; null for a blank sheet. */
  copyOf: string | null;
  onClose: () => void;
  /** Throws ProblemError when the server refuses. */
  onSubmit: (request: { name: string; copyOf: string | null }) => Promise<void>;
}

const BLANK = 'blank';

/** A new variant: its name, and whether it starts blank or as a copy. Mount it to open it. */
export function NewVariantDialog({ layouts, copyOf, onClose, onSubmit }: NewVariantDialogProps) {
  const form = useForm({ resolver: zodResolver(layoutRequestSchema), defaultValues: { name: '', copyOf } });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (request) => {
    try {
      await onSubmit(request);
    } catch (error) {
      applyProblem(form, error);
    }
  });
  const starts = [
    { value: BLANK, label: 'A blank sheet' },
    ...layouts.map((layout) => ({ value: layout.id, label: `A copy of ${layout.letter} · ${layout.name}` })),
  ];
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="New variant"
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button type="submit" form="variant-form" variant="action" busy={isSubmitting} busyLabel="Creating…">
            Create variant
          </Button>
        </>
      }
    >
      <form id="variant-form" onSubmit={submit} noValidate className="flex flex-col gap-4">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        <Field
          label="Name"
          hint="What sets this arrangement apart, for example “robots face to face”."
          error={errors.name?.message}
          required
        >
          <TextInput {...form.register('name')} autoComplete="off" />
        </Field>
        <Field label="Starts as" error={errors.copyOf?.message}>
          <Controller
            control={form.control}
            name="copyOf"
            render={({ field }) => (
              <Select
                value={field.value ?? BLANK}
                onValueChange={(value) => field.onChange(value === BLANK ? null : value)}
                options={starts}
              />
            )}
          />
        </Field>
      </form>
    </Dialog>
  );
}
