'use client';

import { FileUp, Plus } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useCallback, useState } from 'react';
import { NameDialog } from '@/components/forms/name-dialog';
import { NewVariantDialog } from '@/components/forms/new-variant-dialog';
import { ImportLayoutDialog } from '@/components/reports/import-layout-dialog';
import { VariantsTable, type VariantDeed } from '@/components/tables/variants-table';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { Panel } from '@/components/ui/panel';
import { toast } from '@/components/ui/toaster';
import { useLayoutActions, useLayouts } from '@/lib/client/use-project';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import { CompareBar } from './compare-bar';
import { DataPart } from '@/components/ui/data-part';

/** The variants of the project: open, copy, rename, delete, and set two of them against each other. */
export function VariantsPanel({ projectId }: { projectId: string }) {
  const router = useRouter();
  const answer = useLayouts(projectId);
  const actions = useLayoutActions(projectId);
  const [pending, setPending] = useState<{
    deed: VariantDeed | 'create' | 'import';
    layout: LayoutSummary | null;
  } | null>(null);
  const close = (): void => setPending(null);
  const onDeed = useCallback((deed: VariantDeed, layout: LayoutSummary) => setPending({ deed, layout }), []);
  const layouts = answer.data?.layouts ?? [];
  const { deed, layout } = pending ?? { deed: null, layout: null };

  const create = (
    <Button
      variant={layouts.length === 0 ? 'action' : 'plain'}
      size="small"
      onClick={() => setPending({ deed: 'create', layout: null })}
    >
      <Plus aria-hidden className="size-4" />
      New variant
    </Button>
  );
  const bringIn = (
    <Button size="small" onClick={() => setPending({ deed: 'import', layout: null })}>
      <FileUp aria-hidden className="size-4" />
      Import
    </Button>
  );
  const both = (
    <span className="flex flex-wrap gap-2">
      {bringIn}
      {create}
    </span>
  );
  return (
    <Panel title="Variants" aside={layouts.length > 0 && both}>
      <DataPart answer={answer} loading="Loading the variants">
        {() =>
          layouts.length === 0 ? (
            <EmptyState
              title="No variant drawn yet"
              body="A variant is one arrangement of the cell. Start with a blank sheet; later ones can start as copies."
              action={both}
            />
          ) : (
            <>
              <VariantsTable layouts={layouts} onDeed={onDeed} />
              {layouts.length > 1 && <CompareBar projectId={projectId} layouts={layouts} />}
            </>
          )
        }
      </DataPart>
      {deed === 'import' && <ImportLayoutDialog projectId={projectId} onClose={close} />}
      {(deed === 'create' || deed === 'copy') && (
        <NewVariantDialog
          layouts={layouts}
          copyOf={layout?.id ?? null}
          onClose={close}
          onSubmit={async (request) => {
            const made = await actions.create(request);
            router.push(`/projects/${projectId}/layouts/${made.id}`);
          }}
        />
      )}
      {deed === 'rename' && layout && (
        <NameDialog
          title={`Rename variant ${layout.letter}`}
          label="Name"
          start={layout.name}
          onClose={close}
          onSubmit={(name) => actions.rename(layout.id, name)}
        />
      )}
      {deed === 'delete' && layout && (
        <ConfirmDialog
          open
          onOpenChange={close}
          title={`Delete variant ${layout.letter}?`}
          description={`“${layout.name}” and its ${layout.itemCount} items go for good. It was never issued, so no customer has seen it.`}
          confirmLabel="Delete variant"
          danger
          onConfirm={async () => {
            await actions.remove(layout.id);
            toast.success(`Variant ${layout.letter} is deleted`);
          }}
        />
      )}
    </Panel>
  );
}
