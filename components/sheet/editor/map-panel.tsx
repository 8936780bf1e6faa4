'use client';

import { useDeferredValue, useEffect, useRef } from 'react';
import { MapKey } from '@/components/sheet/map-key/map-key';
import { useBoard, useBoardSettings } from './board-context';
import { useFloor } from './floor-context';
import { StackSlider } from './map-height';
import { MapQuestionPopover } from './map-question-popover';
import { mapWork } from './map-work';
import { useMapLook } from './use-map-look';

/** Room between the key and the edges of the canvas, px. */
const MARGIN_PX = 16;

/** The key of the map, over the canvas' lower edge or in a drawer. */
export function MapPanel({ floating = false }: { readonly floating?: boolean }) {
  const { settings: keeper, view } = useBoard();
  const settings = useBoardSettings();
  const { floorMap, entries, unfinished, robotCount, cancel, retry } = useFloor();
  const look = useMapLook();
  // The key may follow a moment behind the picture while a base is dragged.
  const keyedMap = useDeferredValue(floorMap);
  const box = useRef<HTMLDivElement>(null);

  useEffect(() => {
    const element = box.current;
    if (!floating || !element) return;
    const observer = new ResizeObserver(() => view.set({ coveredPx: element.offsetHeight + 2 * MARGIN_PX }));
    observer.observe(element);
    return () => {
      observer.disconnect();
      view.set({ coveredPx: 0 });
    };
  }, [floating, view]);

  const work = mapWork(entries, robotCount, unfinished);
  const each = (act: (key: string) => void, states: readonly string[]) => {
    const keys = entries.filter(({ state }) => states.includes(state)).map(({ key }) => key);
    for (const key of new Set(keys)) act(key);
  };
  const key = (
    <MapKey
      settings={settings}
      scale={look.scale}
      range={look.range}
      map={keyedMap}
      work={work}
      stacked={!floating}
      onMeasureChange={(measure) => keeper.change({ measure })}
      onWristChange={(wrist) => keeper.change({ wrist })}
      onScaleChange={(mapScale) => view.set({ mapScale })}
      onThresholdChange={(threshold) => {
        const { measure, thresholds } = keeper.getSettings();
        if (measure !== 'reach') keeper.change({ thresholds: { ...thresholds, [measure]: threshold } });
      }}
      onCancel={() => each(cancel, ['queued', 'running'])}
      onRetry={() => each(retry, ['failed', 'cancelled', 'unreachable'])}
      questionAction={
        <>
          <MapQuestionPopover />
          <StackSlider />
        </>
      }
    />
  );
  if (!floating) return key;
  return (
    <div ref={box} className="absolute inset-x-4 bottom-4 z-10 mx-auto max-w-[860px]" data-map-work={work.kind}>
      {key}
    </div>
  );
}
