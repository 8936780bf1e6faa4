'use client';

import { FileUp } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { toast } from '@/components/ui/toaster';
import { ProblemError, sayError } from '@/lib/client/fetcher';
import { importLayout } from '@/lib/client/use-reports';

/** Enough to see what is wrong. */
const SHOWN = 8;

/** Takes a layout file in as a new variant, or says what is wrong with it and where. Mount it to open it. */
export function ImportLayoutDialog({
  projectId,
  onClose,
}: {
  readonly projectId: string;
  readonly onClose: () => void;
}) {
  const router = useRouter();
  const chooser = useRef<HTMLInputElement>(null);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<{ words: string; places: readonly string[] } | null>(null);

  const take = async (file: File | undefined): Promise<void> => {
    if (!file) return;
    setBusy(true);
    setFault(null);
    try {
      const made = await importLayout(projectId, file);
      const arms = made.armsAdded.length > 0 ? ` New in the library: ${made.armsAdded.join(', ')}.` : '';
      toast.success(`${made.letter} · ${made.name} is here.${arms}`);
      router.push(`/projects/${projectId}/layouts/${made.layoutId}`);
    } catch (error) {
      const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
      const places = errors.filter(({ message }) => message !== (error as Error).message);
      setFault({
        words: sayError(error),
        places: places.map(({ path, message }) => (path ? `${path}: ${message}` : message)),
      });
      setBusy(false);
    }
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Import a layout"
      description="A JSON file that was exported from Elbowroom becomes a new variant of this project, with its arms and its floor plan."
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button variant="action" busy={busy} busyLabel="Reading the file…" onClick={() => chooser.current?.click()}>
            <FileUp aria-hidden className="size-4" />
            Choose a file
          </Button>
        </>
      }
    >
      <input
        ref={chooser}
        type="file"
        accept=".json,application/json"
        aria-label="Layout file"
        className="sr-only"
        tabIndex={-1}
        onChange={(event) => {
          void take(event.target.files?.[0]);
          event.target.value = '';
        }}
      />
      <div role="alert">
        {fault && (
          <Notice tone="trouble" title={fault.words}>
            {fault.places.length > 0 && (
              <ul className="mt-1 font-normal">
                {fault.places.slice(0, SHOWN).map((place) => (
                  <li key={place} className="break-words">
                    {place}
                  </li>
                ))}
                {fault.places.length > SHOWN && <li>And {fault.places.length - SHOWN} more.</li>}
              </ul>
            )}
          </Notice>
        )}
      </div>
    </Dialog>
  );
}
