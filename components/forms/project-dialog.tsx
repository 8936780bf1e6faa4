'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';
import { projectRequestSchema, type ProjectRequest } from '@/lib/contracts/projects';
import { applyProblem } from './apply-problem';

interface ProjectDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  submitLabel: string;
  /** What stands in the fields at first. */
  start?: ProjectRequest;
  /** Throws ProblemError when the server refuses. */
  onSubmit: (request: ProjectRequest) => Promise<void>;
}

const EMPTY: ProjectRequest = { name: '', customerName: '', siteName: '' };

/** Name, customer and site of a project: for a new one and for one that is renamed. */
export function ProjectDialog({ start = EMPTY, ...dialog }: ProjectDialogProps) {
  // A fresh form each time it opens, so that an abandoned draft does not come back.
  return dialog.open ? <OpenProjectDialog start={start} {...dialog} /> : null;
}

function OpenProjectDialog({ open, onOpenChange, title, submitLabel, start, onSubmit }: ProjectDialogProps) {
  const form = useForm({ resolver: zodResolver(projectRequestSchema), defaultValues: start });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (request) => {
    try {
      await onSubmit(request);
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={title}
      footer={
        <>
          <Button variant="quiet" onClick={() => onOpenChange(false)}>
            Cancel
          </Button>
          <Button type="submit" form="project-form" variant="action" busy={isSubmitting} busyLabel="Saving…">
            {submitLabel}
          </Button>
        </>
      }
    >
      <form id="project-form" onSubmit={submit} noValidate className="flex flex-col gap-4">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        <Field label="Project" hint="One customer's job on one site." error={errors.name?.message} required>
          <TextInput {...form.register('name')} autoComplete="off" />
        </Field>
        <Field label="Customer" error={errors.customerName?.message}>
          <TextInput {...form.register('customerName')} autoComplete="off" />
        </Field>
        <Field label="Site" error={errors.siteName?.message}>
          <TextInput {...form.register('siteName')} autoComplete="off" />
        </Field>
      </form>
    </Dialog>
  );
}
