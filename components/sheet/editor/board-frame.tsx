'use client';

import { useCallback, useState } from 'react';
import { useLayoutRemarks } from '@/lib/client/use-remarks';
import { ItemList } from '@/components/sheet/panels/item-list';
import { Inspector } from '@/components/sheet/panels/inspector';
import { Palette } from '@/components/sheet/panels/palette';
import { PlumbPanel } from '@/components/sheet/panels/plumb-panel';
import { RemarksPanel } from '@/components/sheet/panels/remarks-panel';
import { VerdictTable } from '@/components/sheet/panels/verdict-table';
import { ShareDialog } from '@/components/share/share-dialog';
import { useBoard } from './board-context';
import { Canvas } from './canvas';
import { ConflictDialog } from './conflict-dialog';
import { IssueDialog } from './issue-dialog';
import { LiveRegion } from './live-region';
import { MapPanel } from './map-panel';
import { NarrowDrawer } from './narrow-drawer';
import { NextStep } from './next-step';
import { SheetTitleBlock } from './sheet-title-block';
import { ShortcutsDialog } from './shortcuts-dialog';
import { Toolbar } from './toolbar';
import { TroubleLine } from './trouble-line';
import { useMedia } from './use-media';
import { useSheetKeys } from './use-sheet-keys';

type OpenDialog = 'none' | 'conflict' | 'share' | 'issue' | 'shortcuts';

/** The drawing board: title block above; palette and list, canvas, inspector beside one another, or a drawer on a phone. */
export function BoardFrame() {
  const { layout } = useBoard();
  const [dialog, setDialog] = useState<OpenDialog>('none');
  const [remarkId, setRemarkId] = useState<string | null>(null);
  const remarks = useLayoutRemarks(layout.id);
  const isNarrow = useMedia('(max-width: 1023px)');
  useSheetKeys(useCallback(() => setDialog('shortcuts'), []));

  const place = (
    <>
      <Palette />
      <ItemList />
    </>
  );
  const points = <VerdictTable />;
  const remarkList = <RemarksPanel {...remarks} chosenId={remarkId} onChoose={setRemarkId} />;
  const dialogProps = (name: OpenDialog) => ({
    open: dialog === name,
    onOpenChange: (open: boolean) => setDialog(open ? name : 'none'),
  });

  return (
    <div className="flex h-dvh flex-col overflow-hidden bg-sheet">
      <SheetTitleBlock
        onConflict={() => setDialog('conflict')}
        onShare={() => setDialog('share')}
        onIssue={() => setDialog('issue')}
      />
      <div className="flex min-h-0 flex-1 max-lg:flex-col">
        {!isNarrow && (
          <aside aria-label="Things and list" className="w-[195px] flex-none overflow-y-auto border-r border-rule">
            {place}
          </aside>
        )}
        <main className="relative flex min-h-0 min-w-0 flex-1 flex-col">
          <Toolbar onShortcuts={() => setDialog('shortcuts')} />
          <div className="relative min-h-0 flex-1">
            <Canvas remarks={remarks.remarks ?? []} chosenRemarkId={remarkId} onRemark={setRemarkId} />
            <NextStep />
            <div className="pointer-events-none absolute inset-x-3 top-3 z-10 mx-auto max-w-xl">
              <TroubleLine onConflict={() => setDialog('conflict')} />
            </div>
            {!isNarrow && <MapPanel floating />}
          </div>
        </main>
        {isNarrow ? (
          <NarrowDrawer
            tabs={[
              { id: 'place', label: 'Place', panel: place },
              { id: 'values', label: 'Values', panel: <Inspector emptyWords /> },
              { id: 'plumb', label: 'Plumb', panel: <PlumbPanel /> },
              { id: 'points', label: 'Points', panel: points },
              { id: 'map', label: 'Map', panel: <MapPanel /> },
              { id: 'remarks', label: 'Remarks', panel: remarkList },
            ]}
          />
        ) : (
          <aside aria-label="Values and readings" className="w-[326px] flex-none overflow-y-auto border-l border-rule">
            <Inspector />
            <PlumbPanel />
            {points}
            {remarkList}
          </aside>
        )}
      </div>
      <ConflictDialog {...dialogProps('conflict')} />
      <ShareDialog layoutId={layout.id} {...dialogProps('share')} />
      <IssueDialog {...dialogProps('issue')} />
      <ShortcutsDialog {...dialogProps('shortcuts')} />
      <LiveRegion />
    </div>
  );
}
