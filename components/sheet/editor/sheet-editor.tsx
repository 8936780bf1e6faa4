'use client';

import { useMemo, useState } from 'react';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { TitleBlock } from '@/components/ui/title-block';
import { useAnswer } from '@/lib/client/use-answer';
import { useLayout, type LayoutOnBoard } from '@/lib/client/use-layout';
import { libraryArmListSchema } from '@/lib/contracts/arms';
import { BoardProvider, type Board } from './board-context';
import { BoardFrame } from './board-frame';
import { FloorProvider } from './floor-context';
import { ReadingsProvider } from './readings-context';
import { ViewStore } from './view-store';

interface SheetEditorProps {
  readonly projectId: string;
  readonly layoutId: string;
}

/** A layout, opened for editing. */
export default function SheetEditor({ projectId, layoutId }: SheetEditorProps) {
  const { board, trouble, tryAgain } = useLayout(layoutId);
  if (board) return <OnBoard key={layoutId} opened={board} projectId={projectId} />;
  return (
    <div className="min-h-dvh">
      <TitleBlock cells={[{ label: 'Sheet', value: trouble ? 'Not opened' : 'Opening', heading: true }]} />
      {trouble ? (
        <EmptyState
          title="The sheet could not be opened"
          body={trouble}
          action={
            <>
              <Button variant="action" onClick={tryAgain}>
                Try again
              </Button>
              <LinkButton href={`/projects/${projectId}`}>Back to the project</LinkButton>
            </>
          }
        />
      ) : (
        <LoadingLine label="Opening the sheet" />
      )}
    </div>
  );
}

/** The keyboard goes to the first typed value once the panel with it is drawn and a closing menu has let go of it. */
const FOCUS_AFTER_MS = 40;
const typeValues = (view: ViewStore) => () => {
  view.openSide('values');
  setTimeout(() => document.querySelector<HTMLElement>('[data-first-value]')?.focus(), FOCUS_AFTER_MS);
};

function OnBoard({ opened, projectId }: { readonly opened: LayoutOnBoard; readonly projectId: string }) {
  const { data } = useAnswer('/api/arms', libraryArmListSchema);
  const [view] = useState(() => new ViewStore());
  const board = useMemo<Board>(() => {
    const library = data?.arms ?? [];
    return {
      ...opened,
      projectId,
      view,
      typeValues: typeValues(view),
      isLibraryThere: data !== undefined,
      libraryArms: library
        .filter(({ latest, archivedAt }) => latest && !archivedAt)
        .sort((one, other) => one.name.localeCompare(other.name)),
      arms: new Map([...opened.layout.arms, ...library].map((arm) => [arm.id, arm])),
    };
  }, [opened, projectId, view, data]);
  return (
    <BoardProvider board={board}>
      <FloorProvider>
        <ReadingsProvider>
          <BoardFrame />
        </ReadingsProvider>
      </FloorProvider>
    </BoardProvider>
  );
}
