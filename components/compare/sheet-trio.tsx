'use client';

import { useCallback, useMemo, useState, type ReactNode } from 'react';
import {
  DifferenceLayer,
  GridLayer,
  GroundLayer,
  ItemsLayer,
  MovedMarks,
  OverlayLayer,
  RemarkPins,
  SheetStage,
} from '@/components/sheet/drawing';
import { useMedia } from '@/components/sheet/editor/use-media';
import { WorkLine } from '@/components/sheet/map-key/work-line';
import { SheetReader } from '@/components/sheet/reader/sheet-reader';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { useSize } from '@/components/ui/use-size';
import type { MapScale } from '@/lib/layout/scales';
import { fitBounds, unionBounds, type Viewport } from '@/lib/layout/viewport';
import type { Remark } from '@/lib/contracts/remarks';
import { shortNames } from './sheet-names';
import { LEAST_HEIGHT_PX, TrioPanel } from './trio-panel';
import { DifferenceKey, ScaleKey } from './trio-keys';
import { SwipeSheets } from './swipe-sheets';
import type { CompareLook } from './compare-tools';
import type { Comparison } from './use-comparison';
import type { Side } from './use-side';

interface SheetTrioProps {
  readonly comparison: Comparison;
  readonly scale: MapScale;
  readonly leftRemarks: readonly Remark[];
  /** The choice of measure; stands over the difference. */
  readonly measureChoice: ReactNode;
  readonly look: CompareLook;
}

type Shown = 'left' | 'right' | 'difference';
const FIT_MARGIN_PX = 14;
const HEIGHT_SHARE = 0.88;
/** One sheet over the whole width must still leave the numbers in sight. */
const SWIPE_MOST_PX = 560;

/** Left, right and what changes, moved and zoomed as one. On a narrow screen one at a time, at the same spot of the floor. */
export function SheetTrio({ comparison, scale, leftRemarks, measureChoice, look }: SheetTrioProps) {
  const { left, right } = comparison;
  const [leftName, rightName] = shortNames(left.document, right.document);
  const isNarrow = useMedia('(max-width: 1023px)');
  const [shown, setShown] = useState<Shown>('left');
  const [boxRef, box] = useSize();
  const [moved, setMoved] = useState<Viewport | null>(null);

  const size = useMemo(
    () => box && { width: box.width, height: Math.max(LEAST_HEIGHT_PX, Math.round(box.width * HEIGHT_SHARE)) },
    [box],
  );
  const viewport = useMemo(() => {
    const bounds = unionBounds(left.reading.bounds, right.reading.bounds);
    return moved ?? fitBounds(bounds ?? EMPTY_FLOOR, size ?? { width: 1, height: 1 }, FIT_MARGIN_PX);
  }, [moved, left.reading.bounds, right.reading.bounds, size]);
  const swipeSize = useMemo(
    () => box && { width: box.width, height: Math.round(Math.min(box.width * HEIGHT_SHARE, SWIPE_MOST_PX)) },
    [box],
  );
  const swipeViewport = useMemo(() => {
    const bounds = unionBounds(left.reading.bounds, right.reading.bounds);
    return moved ?? fitBounds(bounds ?? EMPTY_FLOOR, swipeSize ?? { width: 1, height: 1 }, FIT_MARGIN_PX);
  }, [moved, left.reading.bounds, right.reading.bounds, swipeSize]);
  const pins = useMemo(
    () => leftRemarks.map((remark) => ({ ...remark, resolved: remark.resolvedAt !== null })),
    [leftRemarks],
  );

  const shared = size && { ...size, viewport, onViewportChange: setMoved };
  const sheet = (side: Side, name: string, which: 'left' | 'right') => (
    <TrioPanel
      key={which}
      title={`${side.document.letter} · ${side.document.name}`}
      aside={<span className="font-mono text-ink">{side.document.mark}</span>}
      foot={
        side.work.kind === 'none' ? (
          <ScaleKey measure={comparison.measure} scale={scale} range={comparison.range} />
        ) : (
          <div className="min-w-0 flex-1">
            <WorkLine work={side.work} onCancel={side.cancel} onRetry={side.retry} />
          </div>
        )
      }
      // All three are of one size; only one of those that are there needs to be measured.
      measure={which === 'left' || isNarrow ? boxRef : undefined}
      height={size?.height}
    >
      {shared && (
        <SideSheet
          side={side}
          comparison={comparison}
          map={which === 'left' ? comparison.leftMap : comparison.rightMap}
          scale={scale}
          label={`Drawing of ${name}`}
          {...shared}
        >
          {which === 'left' && pins.length > 0 && <RemarkPins remarks={pins} />}
        </SideSheet>
      )}
    </TrioPanel>
  );
  const difference = (
    <TrioPanel
      key="difference"
      title={
        <span className="flex min-w-0 items-center gap-1">
          <span className="shrink-0">
            {rightName} against {leftName},
          </span>
          {measureChoice}
        </span>
      }
      aside={
        <>
          <span className="font-semibold text-red">less</span>
          <span className="font-semibold text-petrol">more</span>
        </>
      }
      foot={<DifferenceKey comparison={comparison} />}
      measure={isNarrow ? boxRef : undefined}
      height={size?.height}
    >
      {shared && (
        <SheetStage {...shared} label={`What changes from ${leftName} to ${rightName}`} dragPans>
          <GroundLayer>
            <DifferenceLayer difference={comparison.difference} limit={comparison.limit} />
            <GridLayer mode="share" />
          </GroundLayer>
          <ItemsLayer
            items={right.document.items}
            arms={right.document.arms}
            mode="share"
            verdicts={right.reading.bands}
          />
          <OverlayLayer listening={false}>
            <MovedMarks moves={comparison.moved} arms={right.document.arms} />
          </OverlayLayer>
        </SheetStage>
      )}
    </TrioPanel>
  );

  if (look === 'swipe') {
    return (
      <TrioPanel
        title={`${leftName} and ${rightName}`}
        aside={measureChoice}
        foot={<ScaleKey measure={comparison.measure} scale={scale} range={comparison.range} />}
        measure={boxRef}
        height={swipeSize?.height}
      >
        {swipeSize && (
          <SwipeSheets
            leftName={leftName}
            rightName={rightName}
            size={swipeSize}
            left={
              <SideSheet
                side={left}
                comparison={comparison}
                map={comparison.leftMap}
                scale={scale}
                label={`Drawing of ${leftName}`}
                {...swipeSize}
                viewport={swipeViewport}
                onViewportChange={setMoved}
              >
                {null}
              </SideSheet>
            }
            right={
              <SideSheet
                side={right}
                comparison={comparison}
                map={comparison.rightMap}
                scale={scale}
                label={`Drawing of ${rightName}`}
                {...swipeSize}
                viewport={swipeViewport}
                onViewportChange={setMoved}
              >
                {null}
              </SideSheet>
            }
          />
        )}
      </TrioPanel>
    );
  }
  if (!isNarrow) {
    return (
      <div className="grid grid-cols-3 gap-3.5">
        {sheet(left, leftName, 'left')}
        {sheet(right, rightName, 'right')}
        {difference}
      </div>
    );
  }
  return (
    <div className="grid gap-2.5">
      <SegmentedControl
        label="Sheet shown"
        value={shown}
        onValueChange={setShown}
        options={[
          { value: 'left', label: leftName },
          { value: 'right', label: rightName },
          { value: 'difference', label: 'Difference' },
        ]}
        className="w-full"
      />
      {shown === 'left' && sheet(left, leftName, 'left')}
      {shown === 'right' && sheet(right, rightName, 'right')}
      {shown === 'difference' && difference}
    </div>
  );
}

const EMPTY_FLOOR = { minXMm: 0, minYMm: 0, maxXMm: 8000, maxYMm: 8000 };

interface SideSheetProps {
  readonly side: Side;
  readonly comparison: Comparison;
  readonly map: Comparison['leftMap'];
  readonly scale: MapScale;
  readonly label: string;
  readonly width: number;
  readonly height: number;
  readonly viewport: Viewport;
  readonly onViewportChange: (viewport: Viewport) => void;
  readonly children: ReactNode;
}

function SideSheet({ side, comparison, ...rest }: SideSheetProps) {
  const planId = side.document.floorPlan?.id ?? '';
  const pictureUrl = useCallback((width: number) => `/api/floor-plans/${planId}/picture?width=${width}`, [planId]);
  return (
    <SheetReader
      {...rest}
      document={side.document}
      reading={side.reading}
      range={comparison.range}
      threshold={comparison.threshold}
      pictureUrl={pictureUrl}
    />
  );
}
