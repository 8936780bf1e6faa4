'use client';

import { Hand, Keyboard, Maximize, Minus, MousePointer2, Plus, Redo2, Undo2 } from 'lucide-react';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Tooltip } from '@/components/ui/tooltip';
import { selectTool } from '@/lib/editor/tools/select';
import { panTool } from '@/lib/editor/tools/place';
import { zoomAt } from '@/lib/layout/viewport';
import { useBoard, useBoardSheet } from './board-context';
import { WhoElse } from './who-else';
import { EditMenu } from './edit-menu';
import { FloorPlanChoice } from './floor-plan-choice';
import { LayersChoice } from './layers-choice';
import { SnapChoice } from './snap-choice';
import { sheetBounds } from './sheet-bounds';

const ZOOM = 1.25;

/** The strip over the canvas: hand and arrow, history, snapping, the floor plan, and the view. */
export function Toolbar({ onShortcuts }: { readonly onShortcuts: () => void }) {
  const { sheet, view, floorPlan, arms } = useBoard();
  const toolName = useBoardSheet((state) => state.tool.name);
  const history = useBoardSheet((state) => state.history);
  const zoom = (factor: number) => {
    const { viewport, size } = view.get();
    view.look(zoomAt(viewport, { x: size.width / 2, y: size.height / 2 }, factor));
  };
  const fit = () => view.fit(sheetBounds(sheet.getState().items, arms, floorPlan));
  const lastDone = history.past.at(-1)?.label;
  const lastUndone = history.future.at(-1)?.label;
  return (
    <div
      role="toolbar"
      aria-label="The sheet"
      className="flex min-h-9 flex-none items-center gap-0.5 overflow-x-auto border-b border-rule bg-sheet px-1.5"
    >
      <Tool label="Choose and move" hint="V" pressed={toolName === 'select'} onClick={() => sheet.use(selectTool())}>
        <MousePointer2 aria-hidden className="size-4" />
      </Tool>
      <Tool label="Move the view" hint="H" pressed={toolName === 'pan'} onClick={() => sheet.use(panTool())}>
        <Hand aria-hidden className="size-4" />
      </Tool>
      <Gap />
      <Tool
        label="Undo"
        hint={lastDone ? `${lastDone}, Ctrl Z` : 'Nothing to undo'}
        disabled={!lastDone}
        onClick={() => sheet.undo()}
      >
        <Undo2 aria-hidden className="size-4" />
      </Tool>
      <Tool
        label="Redo"
        hint={lastUndone ? `${lastUndone}, Ctrl Shift Z` : 'Nothing to redo'}
        disabled={!lastUndone}
        onClick={() => sheet.redo()}
      >
        <Redo2 aria-hidden className="size-4" />
      </Tool>
      <EditMenu />
      <Gap />
      <SnapChoice />
      <FloorPlanChoice />
      <LayersChoice />
      <WhoElse />
      <Tool label="Zoom out" hint="−" onClick={() => zoom(1 / ZOOM)}>
        <Minus aria-hidden className="size-4" />
      </Tool>
      <Tool label="Zoom in" hint="+" onClick={() => zoom(ZOOM)}>
        <Plus aria-hidden className="size-4" />
      </Tool>
      <Tool label="Show the whole sheet" hint="0" onClick={fit}>
        <Maximize aria-hidden className="size-4" />
      </Tool>
      <Tool label="Keys and gestures" hint="?" onClick={onShortcuts}>
        <Keyboard aria-hidden className="size-4" />
      </Tool>
    </div>
  );
}

interface ToolProps {
  readonly label: string;
  readonly hint: string;
  readonly pressed?: boolean;
  readonly disabled?: boolean;
  readonly onClick: () => void;
  readonly children: ReactNode;
}

function Tool({ label, hint, pressed, disabled, onClick, children }: ToolProps) {
  return (
    <Tooltip content={`${label} (${hint})`}>
      <Button
        variant="quiet"
        size="icon"
        aria-label={label}
        aria-pressed={pressed}
        // Kept in reach of the keyboard while it has nothing to do, so that focus is not lost with the last undo.
        aria-disabled={disabled}
        onClick={disabled ? undefined : onClick}
        className="size-8 aria-pressed:bg-ink aria-pressed:text-sheet"
      >
        {children}
      </Button>
    </Tooltip>
  );
}

const Gap = () => <span aria-hidden className="mx-1 h-5 border-l border-hair" />;
