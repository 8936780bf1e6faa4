'use client';

import { ChevronDown, ChevronUp } from 'lucide-react';
import { useMemo, useState } from 'react';
import { useBoard, useBoardSettings, useBoardSheet, useView } from '@/components/sheet/editor/board-context';
import { usePostures } from '@/components/sheet/editor/readings-context';
import { useMapLook } from '@/components/sheet/editor/use-map-look';
import { NARROW, useMedia } from '@/components/sheet/editor/use-media';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { useSize } from '@/components/ui/use-size';
import { inOrder } from '@/lib/editor/order';
import { shownItems } from '@/lib/editor/sheet';
import type { Item, Robot, SectionLine } from '@/lib/layout/items';
import { MEASURE_WORDS } from '@/lib/layout/measure-words';
import { cutLengthMm, cutOfLine } from '@/lib/layout/section-cut';
import { SectionDrawing } from './section-drawing';
import { silhouetteOf } from './section-figures';
import { useSection } from './use-section';

/** The most that the drawing may take of the page, px; and what its lettering takes of that. */
const HEIGHT_PX = 230;
const NARROW_HEIGHT_PX = 150;
const LETTERING_PX = { width: 76, height: 30 };

const isLine = (item: Item): item is SectionLine => item.kind === 'sectionLine' && !item.hidden;
const isRobot = (item: Item): item is Robot => item.kind === 'robot' && !item.hidden;

/** Under the plan: the vertical map along a section line. Nothing while the sheet has no such line. */
export function SectionStrip() {
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const chosenIds = useBoardSheet((state) => state.selection.itemIds);
  const shown = useMemo(() => inOrder(shownItems({ items, draft })), [items, draft]);
  const lines = useMemo(() => shown.filter(isLine), [shown]);
  const isNarrow = useMedia(NARROW);
  const [open, setOpen] = useState<boolean | null>(null);
  const [picked, setPicked] = useState<string | null>(null);
  const chosen = lines.find(({ id }) => chosenIds.includes(id));
  const line = chosen ?? lines.find(({ id }) => id === picked) ?? lines[0];
  if (!line) return null;
  // A phone has little room under the plan: there it opens on request.
  const isOpen = open ?? !isNarrow;
  return (
    <section aria-label={`Section ${line.letter}–${line.letter}`} className="flex-none border-t border-rule bg-sheet">
      <div className="flex min-h-8 items-center gap-3 px-3.5">
        <button
          type="button"
          aria-expanded={isOpen}
          onClick={() => setOpen(!isOpen)}
          className="-mx-1 flex items-center gap-1 px-1 text-[0.8125rem] font-semibold hover:bg-petrol-wash pointer-coarse:min-h-11"
        >
          Section {line.letter}–{line.letter}
          {isOpen ? <ChevronDown aria-hidden className="size-4" /> : <ChevronUp aria-hidden className="size-4" />}
        </button>
        {lines.length > 1 && lines.length < 7 && (
          <SegmentedControl
            label="Section shown"
            value={line.id}
            onValueChange={setPicked}
            options={lines.map(({ id, letter }) => ({ value: id, label: `${letter}–${letter}` }))}
          />
        )}
      </div>
      {isOpen && <OpenStrip line={line} items={shown} maxHeightPx={isNarrow ? NARROW_HEIGHT_PX : HEIGHT_PX} />}
    </section>
  );
}

interface OpenStripProps {
  readonly line: SectionLine;
  readonly items: readonly Item[];
  readonly maxHeightPx: number;
}

function OpenStrip({ line, items, maxHeightPx }: OpenStripProps) {
  const { arms } = useBoard();
  const settings = useBoardSettings();
  const { viewport } = useView();
  const postures = usePostures();
  const look = useMapLook();
  const [box, size] = useSize();
  const width = size?.width ?? 0;
  const cut = useMemo(() => cutOfLine(line), [line]);
  const robots = useMemo(() => items.filter(isRobot), [items]);
  const { map, isFine } = useSection(cut, robots);
  const silhouettes = useMemo(
    () =>
      robots.flatMap((robot) => {
        const [arm, posture] = [arms.get(robot.armId), postures.get(robot.id)];
        return (arm && posture && silhouetteOf(robot, arm, posture, cut)) || [];
      }),
    [robots, arms, postures, cut],
  );
  const heightMm = Math.max(1, cut.zToMm - cut.zFromMm);
  // As large as the plan where there is room, so that one can be held against the other.
  const pxPerMm = Math.min(
    viewport.scale,
    Math.max(80, width - LETTERING_PX.width) / Math.max(1, cutLengthMm(cut)),
    (maxHeightPx - LETTERING_PX.height) / heightMm,
  );
  return (
    <div ref={box} className="overflow-x-auto px-2 pb-2" data-section={line.letter}>
      {width > 0 && (
        <SectionDrawing
          cut={cut}
          letter={line.letter}
          map={map}
          look={look}
          isFine={isFine}
          silhouettes={silhouettes}
          toolHeightMm={settings.toolHeightMm}
          pxPerMm={pxPerMm}
        />
      )}
      <p className="px-1.5 text-[0.8125rem] text-ink-soft" role="status">
        {robots.length === 0
          ? 'Place a robot: its map in this section is shown here.'
          : map
            ? `${MEASURE_WORDS[settings.measure].name} along the line, the plan's colours${isFine ? '' : ', still coarse'}.`
            : 'Working the section out.'}
      </p>
    </div>
  );
}
