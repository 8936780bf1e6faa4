'use client';

import { useCallback, useState } from 'react';
import { ItemList } from '@/components/sheet/panels/item-list';
import { Palette } from '@/components/sheet/panels/palette';
import { SectionStrip } from '@/components/sheet/panels/section-strip';
import { ShareDialog } from '@/components/share/share-dialog';
import { useBoard } from './board-context';
import { Canvas } from './canvas';
import { ConflictDialog } from './conflict-dialog';
import { IssueDialog } from './issue-dialog';
import { LiveRegion } from './live-region';
import { MapPanel } from './map-panel';
import { NarrowDrawer } from './narrow-drawer';
import { NextStep } from './next-step';
import { RemarksProvider } from './board-remarks';
import { SIDE_PANELS } from './side-panels';
import { SideTabs, TabLabel } from './side-tabs';
import { SheetTitleBlock } from './sheet-title-block';
import { ShortcutsDialog } from './shortcuts-dialog';
import { Toolbar } from './toolbar';
import { TroubleLine } from './trouble-line';
import { NARROW, useMedia } from './use-media';
import { useClipboardEvents } from './use-clipboard';
import { useSheetKeys } from './use-sheet-keys';

type OpenDialog = 'none' | 'conflict' | 'share' | 'issue' | 'shortcuts';

/** The drawing board: title block above; palette and list, canvas, inspector beside one another, or a drawer on a phone. */
export function BoardFrame() {
  const { layout } = useBoard();
  const [dialog, setDialog] = useState<OpenDialog>('none');
  const isNarrow = useMedia(NARROW);
  useSheetKeys(useCallback(() => setDialog('shortcuts'), []));
  useClipboardEvents();

  const place = (
    <>
      <Palette />
      <ItemList />
    </>
  );
  const dialogProps = (name: OpenDialog) => ({
    open: dialog === name,
    onOpenChange: (open: boolean) => setDialog(open ? name : 'none'),
  });

  return (
    <RemarksProvider>
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
              <Canvas />
              <NextStep />
              <div className="pointer-events-none absolute inset-x-3 top-3 z-10 mx-auto max-w-xl">
                <TroubleLine onConflict={() => setDialog('conflict')} />
              </div>
              {!isNarrow && <MapPanel floating />}
            </div>
            <SectionStrip />
          </main>
          {isNarrow ? (
            <NarrowDrawer
              tabs={[
                { id: 'place', label: 'Place', panel: place },
                { id: 'map', label: 'Map', panel: <MapPanel /> },
                ...SIDE_PANELS.map(({ id, label, useWaiting, Panel }) => ({
                  id,
                  label: <TabLabel label={label} useWaiting={useWaiting} />,
                  panel: <Panel />,
                })),
              ]}
            />
          ) : (
            <SideTabs />
          )}
        </div>
        <ConflictDialog {...dialogProps('conflict')} />
        <ShareDialog layoutId={layout.id} {...dialogProps('share')} />
        <IssueDialog {...dialogProps('issue')} />
        <ShortcutsDialog {...dialogProps('shortcuts')} />
        <LiveRegion />
      </div>
    </RemarksProvider>
  );
}
