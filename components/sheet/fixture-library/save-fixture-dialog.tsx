'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { applyProblem } from '@/components/forms/apply-problem';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';
import { toast } from '@/components/ui/toaster';
import { useLibraryFixtureActions } from '@/lib/client/use-library-fixtures';
import { libraryFixtureChangeSchema } from '@/lib/contracts/library-fixtures';
import { contentOf } from '@/lib/editor/saved-fixtures';
import type { Fixture } from '@/lib/layout/items';

interface SaveFixtureDialogProps {
  readonly fixture: Fixture;
  readonly onClose: () => void;
}

/** Keeps a fixture in the organisation's library under a name. Mount it to open it. */
export function SaveFixtureDialog({ fixture, onClose }: SaveFixtureDialogProps) {
  const { save } = useLibraryFixtureActions();
  const form = useForm({
    resolver: zodResolver(libraryFixtureChangeSchema),
    defaultValues: { name: fixture.name },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async ({ name }) => {
    try {
      await save({ name, content: contentOf(fixture) });
      toast.success(`${name} is in the library`);
      onClose();
    } catch (error) {
      applyProblem(form, error);
    }
  });
  const count = fixture.taskPoints.length;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Save to the library"
      description={`Outline, heights and ${count === 1 ? 'one task point' : `${count} task points`} are kept for every project. What stands on this sheet stays a copy of its own.`}
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button type="submit" form="save-fixture-form" variant="action" busy={isSubmitting} busyLabel="Saving…">
            Save to the library
          </Button>
        </>
      }
    >
      <form id="save-fixture-form" onSubmit={submit} noValidate className="flex flex-col gap-4">
        {errors.root && <Notice tone="trouble">{errors.root.message}</Notice>}
        <Field label="Name in the library" error={errors.name?.message} required>
          <TextInput autoComplete="off" {...form.register('name')} />
        </Field>
      </form>
    </Dialog>
  );
}
