'use client';

import type { ReactNode } from 'react';
import {
  FloorPlanLayer,
  GridLayer,
  GroundLayer,
  ItemsLayer,
  MapLayer,
  OverlayLayer,
  SheetStage,
  TaskWorkLayer,
  type SheetPointer,
} from '@/components/sheet/drawing';
import type { SheetDocument } from '@/lib/client/sheet-document';
import type { FloorMap } from '@/lib/layout/floor-map';
import type { MapScale, ValueRange } from '@/lib/layout/scales';
import type { Viewport } from '@/lib/layout/viewport';
import type { SheetReading } from './use-sheet-reading';

export interface SheetReaderProps {
  readonly document: SheetDocument;
  readonly reading: SheetReading;
  readonly width: number;
  readonly height: number;
  readonly viewport: Viewport;
  readonly onViewportChange: (viewport: Viewport) => void;
  readonly label: string;
  /** Must keep its identity between renders. */
  readonly pictureUrl: (widthPx: number) => string;
  readonly map: FloorMap | null;
  readonly scale: MapScale;
  readonly range: ValueRange;
  readonly threshold?: number | null;
  readonly isoLines?: readonly number[] | null;
  readonly onFloorTap?: (pointer: SheetPointer) => void;
  readonly cursor?: string;
  /** Marks over the items. */
  readonly children?: ReactNode;
}

/** A sheet to look at: drag and pinch move it, nothing on it can be moved. */
export function SheetReader(props: SheetReaderProps) {
  const { document, reading, children } = props;
  return (
    <SheetStage
      width={props.width}
      height={props.height}
      viewport={props.viewport}
      onViewportChange={props.onViewportChange}
      label={props.label}
      dragPans
      cursor={props.cursor}
      onFloorTap={props.onFloorTap}
    >
      <GroundLayer>
        <MapLayer
          map={props.map}
          scale={props.scale}
          range={props.range}
          threshold={props.threshold}
          isoLines={props.isoLines}
          mode="share"
        />
        <GridLayer mode="share" />
        <FloorPlanLayer floorPlan={document.floorPlan} pictureUrl={props.pictureUrl} mode="share" />
      </GroundLayer>
      <ItemsLayer
        items={document.items}
        arms={document.arms}
        mode="share"
        postures={reading.postures}
        verdicts={reading.bands}
      />
      <TaskWorkLayer {...reading.work} mode="share" />
      {children && <OverlayLayer>{children}</OverlayLayer>}
    </SheetStage>
  );
}
