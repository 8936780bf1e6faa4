'use client';

import { useMemo, useState } from 'react';
import { Crosshair, RemarkPins } from '@/components/sheet/drawing';
import { SheetReader } from '@/components/sheet/reader/sheet-reader';
import type { SheetReading } from '@/components/sheet/reader/use-sheet-reading';
import { Button } from '@/components/ui/button';
import { useSize } from '@/components/ui/use-size';
import { fitBounds, type FloorPoint, type Viewport } from '@/lib/layout/viewport';
import type { ReviewSubject } from './review-subject';
import type { ReviewMap } from './use-review-map';

interface ReviewDrawingProps {
  readonly subject: ReviewSubject;
  readonly reading: SheetReading;
  readonly reviewMap: ReviewMap;
  readonly chosenId: string | null;
  readonly onChoose: (remarkId: string) => void;
  /** Where a new remark is being pinned; null while none is. */
  readonly spot: FloorPoint | null;
  readonly onSpot: (spot: FloorPoint) => void;
}

const EMPTY_FLOOR = { minXMm: 0, minYMm: 0, maxXMm: 8000, maxYMm: 8000 };

/** The frozen sheet with its map and pins. A tap on the floor is where a remark goes. */
export function ReviewDrawing(props: ReviewDrawingProps) {
  const { subject, reading, reviewMap, chosenId, onChoose, spot, onSpot } = props;
  const [boxRef, size] = useSize();
  const [moved, setMoved] = useState<Viewport | null>(null);
  const fitted = useMemo(
    () => (size ? fitBounds(reading.bounds ?? EMPTY_FLOOR, size, size.width < 600 ? 10 : 36) : null),
    [size, reading.bounds],
  );
  const viewport = moved ?? fitted;
  const pins = useMemo(
    () => (subject.review.remarks ?? []).map((remark) => ({ ...remark, resolved: remark.resolvedAt !== null })),
    [subject.review.remarks],
  );
  const { letter, name } = subject.document;
  return (
    <div ref={boxRef} className="relative size-full overflow-hidden bg-sheet">
      {size && viewport && (
        <SheetReader
          document={subject.document}
          reading={reading}
          width={size.width}
          height={size.height}
          viewport={viewport}
          onViewportChange={setMoved}
          label={`Drawing of ${letter} · ${name}. All that is pinned to it is listed beside it.`}
          pictureUrl={subject.pictureUrl}
          map={reviewMap.map}
          scale="tide"
          range={reviewMap.range}
          threshold={reviewMap.threshold}
          isoLines={reviewMap.isoLines}
          cursor={subject.mayRemark ? 'crosshair' : undefined}
          onFloorTap={subject.mayRemark ? ({ floor }) => onSpot(floor) : undefined}
        >
          <RemarkPins remarks={pins} chosenId={chosenId} onPinPointerDown={onChoose} />
          {spot && <Crosshair xMm={spot.xMm} yMm={spot.yMm} />}
        </SheetReader>
      )}
      {moved && (
        <Button size="small" className="absolute top-2 right-2" onClick={() => setMoved(null)}>
          Whole sheet
        </Button>
      )}
    </div>
  );
}
