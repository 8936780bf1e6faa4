'use client';

import { Download } from 'lucide-react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Panel } from '@/components/ui/panel';
import { toast } from '@/components/ui/toaster';
import { sayError } from '@/lib/client/fetcher';
import { saveFile } from '@/lib/client/save-file';
import type { ExportFile, ExportSubject } from '@/lib/contracts/exports';

const FILES: readonly { file: ExportFile; name: string; words: string }[] = [
  {
    file: 'layout.json',
    name: 'Layout as JSON',
    words: 'All of it, with arms and floor plan. It can be imported into any project again.',
  },
  { file: 'layout.dxf', name: 'Linework as DXF', words: 'In millimetres, one layer a kind of thing.' },
  { file: 'verdicts.csv', name: 'Verdicts as CSV', words: 'Every task point and every robot.' },
  { file: 'map.csv', name: 'Map values as CSV', words: 'Every spot of every robot’s finished map.' },
];

/** Files that are made at once. */
export function FilesPanel({ subject, subjectId }: { readonly subject: ExportSubject; readonly subjectId: string }) {
  const [busy, setBusy] = useState<ExportFile | null>(null);
  const save = async (file: ExportFile): Promise<void> => {
    setBusy(file);
    try {
      toast.success(`${await saveFile(`/api/exports/${subject}/${subjectId}/${file}`)} is saved`);
    } catch (error) {
      toast.error(sayError(error));
    } finally {
      setBusy(null);
    }
  };
  return (
    <Panel title="Files">
      <ul>
        {FILES.map(({ file, name, words }) => (
          <li
            key={file}
            className="flex min-h-12 items-center justify-between gap-3 border-t border-hair px-3.5 py-2 first:border-t-0"
          >
            <div className="min-w-0">
              <p className="font-medium">{name}</p>
              <p className="text-sm text-ink-soft">{words}</p>
            </div>
            <Button
              size="small"
              className="shrink-0"
              aria-label={`Download: ${name}`}
              busy={busy === file}
              busyLabel="Making it…"
              disabled={busy !== null && busy !== file}
              onClick={() => void save(file)}
            >
              <Download aria-hidden className="size-4" />
              Download
            </Button>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
