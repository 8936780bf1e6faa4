'use client';

import { useEffect, useMemo, useRef, useState } from 'react';
import {
  FloorPlanLayer,
  GridLayer,
  GroundLayer,
  ItemsLayer,
  MapLayer,
  OverlayLayer,
  RemarkPins,
  SelectionHandles,
  ShapeGrips,
  SheetStage,
  type DrawnBand,
  TaskWorkLayer,
} from '@/components/sheet/drawing';
import { StudyLegend } from '@/components/sheet/studies/study-legend';
import { StudyMarks } from '@/components/sheet/studies/study-marks';
import { useStudyFloor } from '@/components/sheet/studies/use-study-floor';
import { useLayers } from '@/lib/client/use-layers';
import { useUnits } from '@/lib/client/use-units';
import { keepSameMap } from '@/lib/editor/keep-same';
import { inOrder } from '@/lib/editor/order';
import { shownItems } from '@/lib/editor/sheet';
import { settledItems } from '@/lib/layout/attached-dimensions';
import { floorWork } from '@/lib/layout/judging/drawn-work';
import { useBoardRemarks } from './board-remarks';
import { useBoard, useBoardSettings, useBoardSheet, useView } from './board-context';
import { DraftMarks } from './draft-marks';
import { useFloor } from './floor-context';
import { OtherPlanners } from './other-planners';
import { PlumbMarks } from './plumb-marks';
import { usePostures, useVerdicts } from './readings-context';
import { sheetBounds } from './sheet-bounds';
import { usePlanPoints } from './use-plan-points';
import { useMapLook } from './use-map-look';
import { useToolPointer } from './use-tool-pointer';

/** The drawing in the middle of the board. */
export function Canvas() {
  const { arms, floorPlan, layout, view } = useBoard();
  const { viewport, size } = useView();
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const selection = useBoardSheet((state) => state.selection);
  const tool = useBoardSheet((state) => state.tool);
  const { floorMap, isDragging, isLive, laidHeightMm } = useFloor();
  const { byPoint, cell } = useVerdicts();
  const postures = usePostures();
  const settings = useBoardSettings();
  const look = useMapLook();
  const layers = useLayers();
  const { unit } = useUnits();
  usePlanPoints();
  const study = useStudyFloor();
  const pointer = useToolPointer();
  const box = useRef<HTMLDivElement>(null);
  useMeasuredAndFitted(box);

  const shown = useMemo(() => settledItems(inOrder(shownItems({ items, draft }))), [items, draft]);
  const selectedIds = useMemo(
    () => new Set([...selection.itemIds, ...(draft?.items.map(({ id }) => id) ?? [])]),
    [selection, draft],
  );
  const chosenItems = useMemo(
    () => shown.filter((item) => selection.itemIds.includes(item.id) && !item.hidden),
    [shown, selection],
  );
  const [keepBands] = useState(keepSameMap<string, DrawnBand>);
  const bands = keepBands(
    useMemo(() => new Map([...byPoint].map(([pointId, { best }]) => [pointId, best?.band ?? 'unknown'])), [byPoint]),
  );
  const work = useMemo(() => floorWork(shown, cell), [shown, cell]);
  const { remarks, chosenId: chosenRemarkId, choose: onRemark } = useBoardRemarks();
  const pins = useMemo(
    () => (remarks ?? []).map((remark) => ({ ...remark, resolved: remark.resolvedAt !== null })),
    [remarks],
  );
  const pictureUrl = useMemo(() => {
    const address = `/api/floor-plans/${encodeURIComponent(floorPlan?.id ?? '')}/picture?width=`;
    return (widthPx: number) => address + widthPx;
  }, [floorPlan?.id]);
  const { measure, thresholds } = settings;

  return (
    <div
      ref={box}
      className="absolute inset-0"
      data-canvas
      data-viewport={JSON.stringify(viewport)}
      data-tool={tool.name}
      data-map-height={laidHeightMm ?? undefined}
    >
      {size.width > 0 && (
        <SheetStage
          width={size.width}
          height={size.height}
          viewport={viewport}
          onViewportChange={(next) => view.look(next)}
          label={`Drawing of ${layout.name}. The list on the left holds everything on it.`}
          dragPans={tool.name === 'pan'}
          cursor={CURSORS[tool.name] ?? 'crosshair'}
          onFloorPointerDown={pointer.onFloor}
          onPointerMove={pointer.onMove}
          onPointerUp={pointer.onUp}
          onPointerCancel={pointer.onTakenAway}
          onPointerLeave={pointer.onLeave}
          onDoubleClick={pointer.onFinish}
        >
          <GroundLayer>
            <MapLayer
              map={study?.map ?? floorMap}
              scale={look.scale}
              range={study?.range ?? look.range}
              threshold={study || measure === 'reach' ? null : thresholds[measure]}
              isoLines={study || isDragging || isLive ? null : look.isoLines}
              showsBranches={!isDragging && !isLive}
              opacity={layers.map}
            />
            <GridLayer />
            <FloorPlanLayer floorPlan={floorPlan} pictureUrl={pictureUrl} opacity={layers.plan} />
          </GroundLayer>
          <ItemsLayer
            items={shown}
            arms={arms}
            mode="edit"
            opacity={layers.linework}
            lengthUnit={unit}
            selectedIds={selectedIds}
            selectedTaskPointId={selection.taskPointId}
            postures={postures}
            verdicts={bands}
            onItemPointerDown={tool.name === 'pan' ? undefined : pointer.onItem}
            onTaskPointPointerDown={tool.name === 'pan' ? undefined : pointer.onTaskPoint}
          />
          <TaskWorkLayer {...work} chosenId={selection.taskPointId} mode="edit" />
          <OverlayLayer>
            {tool.name === 'select' && (
              <SelectionHandles items={chosenItems} arms={arms} onHandlePointerDown={pointer.onHandle} />
            )}
            {(tool.name === 'select' || tool.name === 'outline') && (
              <ShapeGrips
                items={chosenItems}
                chosenPointId={selection.taskPointId}
                onGripPointerDown={pointer.onGrip}
              />
            )}
            <StudyMarks />
            <PlumbMarks />
            <DraftMarks />
            <OtherPlanners />
            <RemarkPins remarks={pins} chosenId={chosenRemarkId} onPinPointerDown={onRemark} />
          </OverlayLayer>
        </SheetStage>
      )}
      <StudyLegend />
      {tool.name !== 'select' && (
        <p
          role="status"
          className="pointer-events-none absolute top-2 left-1/2 -translate-x-1/2 border border-rule bg-sheet px-3 py-1 text-sm max-sm:w-[92%]"
        >
          {tool.hint}
        </p>
      )}
    </div>
  );
}

const CURSORS: Partial<Record<string, string>> = { select: 'default', pan: 'grab' };

/** Keeps the canvas at the size of its box, and shows the whole sheet at the start and when another floor plan comes under it. */
function useMeasuredAndFitted(box: React.RefObject<HTMLDivElement | null>): void {
  const { view, sheet, floorPlan, arms } = useBoard();
  const fittedTo = useRef<string | null>(null);
  useEffect(() => {
    const element = box.current;
    if (!element) return;
    const measure = () => view.set({ size: { width: element.clientWidth, height: element.clientHeight } });
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    measure();
    const ground = floorPlan?.id ?? 'bare';
    if (fittedTo.current !== ground) view.fit(sheetBounds(sheet.getState().items, arms, floorPlan));
    fittedTo.current = ground;
    return () => observer.disconnect();
  }, [box, view, sheet, floorPlan, arms]);
}
