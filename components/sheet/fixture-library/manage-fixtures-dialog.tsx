'use client';

import { Pencil, Trash2 } from 'lucide-react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { zodResolver } from '@hookform/resolvers/zod';
import { applyProblem } from '@/components/forms/apply-problem';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { DataPart } from '@/components/ui/data-part';
import { Dialog } from '@/components/ui/dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';
import { useLibraryFixtureActions, useLibraryFixtures } from '@/lib/client/use-library-fixtures';
import { libraryFixtureChangeSchema, type LibraryFixture } from '@/lib/contracts/library-fixtures';
import { savedWords } from './saved-words';

/** The organisation's own fixtures: rename them, or take them out of the library. Mount it to open it. */
export function ManageFixturesDialog({ onClose }: { readonly onClose: () => void }) {
  const answer = useLibraryFixtures();
  const { remove } = useLibraryFixtureActions();
  const [renamedId, setRenamedId] = useState<string | null>(null);
  const [leaving, setLeaving] = useState<LibraryFixture | null>(null);
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Own fixtures">
      <DataPart answer={answer} loading="Opening the library">
        {({ fixtures }) =>
          fixtures.length === 0 ? (
            <EmptyState
              title="The library is empty"
              body="Choose a fixture on the sheet and save it to the library from its values."
            />
          ) : (
            <ul className="-mx-4 -my-2">
              {fixtures.map((fixture) => (
                <li key={fixture.id} className="border-b border-hair px-4 py-2 last:border-b-0">
                  {fixture.id === renamedId ? (
                    <RenameForm fixture={fixture} onDone={() => setRenamedId(null)} />
                  ) : (
                    <div className="flex items-center gap-1">
                      <span className="min-w-0 flex-1">
                        <span className="block truncate font-medium">{fixture.name}</span>
                        <span className="text-sm text-ink-soft">{savedWords(fixture)}</span>
                      </span>
                      <Button
                        variant="quiet"
                        size="icon"
                        aria-label={`Rename ${fixture.name}`}
                        onClick={() => setRenamedId(fixture.id)}
                      >
                        <Pencil aria-hidden className="size-4" />
                      </Button>
                      <Button
                        variant="quiet"
                        size="icon"
                        aria-label={`Delete ${fixture.name}`}
                        onClick={() => setLeaving(fixture)}
                      >
                        <Trash2 aria-hidden className="size-4" />
                      </Button>
                    </div>
                  )}
                </li>
              ))}
            </ul>
          )
        }
      </DataPart>
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={(open) => !open && setLeaving(null)}
        title={`Delete ${leaving?.name ?? ''} from the library?`}
        description="It can no longer be placed. What already stands on sheets stays there."
        confirmLabel="Delete it"
        danger
        onConfirm={async () => {
          if (leaving) await remove(leaving.id);
        }}
      />
    </Dialog>
  );
}

function RenameForm({ fixture, onDone }: { readonly fixture: LibraryFixture; readonly onDone: () => void }) {
  const { rename } = useLibraryFixtureActions();
  const form = useForm({
    resolver: zodResolver(libraryFixtureChangeSchema),
    defaultValues: { name: fixture.name },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async ({ name }) => {
    try {
      await rename(fixture.id, name);
      onDone();
    } catch (error) {
      applyProblem(form, error);
    }
  });
  return (
    <form onSubmit={submit} noValidate className="flex items-start gap-2">
      <Field
        label={`New name of ${fixture.name}`}
        labelHidden
        error={errors.name?.message ?? errors.root?.message}
        className="min-w-0 flex-1"
      >
        <TextInput autoComplete="off" autoFocus {...form.register('name')} />
      </Field>
      <Button type="submit" variant="action" busy={isSubmitting}>
        Rename
      </Button>
      <Button variant="quiet" onClick={onDone}>
        Cancel
      </Button>
    </form>
  );
}
