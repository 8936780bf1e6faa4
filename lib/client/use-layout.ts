'use client';

import { useCallback, useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { layoutSchema } from '@/lib/contracts/layouts';
import type { SaveStatus } from '@/lib/editor/autosave';
import { worstOf } from '@/lib/editor/settings-keeper';
import type { SheetState } from '@/lib/editor/sheet';
import type { MapSettings } from '@/lib/layout/map-settings';
import { useAccount } from './account-context';
import { fetcher, sayError, send } from './fetcher';
import { openLayout, type OpenLayout } from './open-layout';

export interface LayoutOnBoard extends OpenLayout {
  readonly floorPlan: FloorPlan | null;
  /** Puts another floor plan of the project under the sheet, or none. Throws ProblemError. */
  chooseFloorPlan(floorPlanId: string | null): Promise<void>;
}

export interface LayoutAnswer {
  readonly board: LayoutOnBoard | null;
  readonly trouble: string | null;
  readonly tryAgain: () => void;
}

/** Opens a layout for editing while the component is mounted. */
export function useLayout(layoutId: string): LayoutAnswer {
  const [opened, setOpened] = useState<OpenLayout | null>(null);
  const [floorPlan, setFloorPlan] = useState<FloorPlan | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [attempt, setAttempt] = useState(0);
  const { id: userId } = useAccount();

  const reloadFloorPlan = useCallback(async () => {
    const layout = await fetcher(`/api/layouts/${encodeURIComponent(layoutId)}`, layoutSchema);
    setFloorPlan(layout.floorPlan);
  }, [layoutId]);

  useEffect(() => {
    let left = false;
    let current: OpenLayout | null = null;
    let shownPlan: string | null = null;
    const onFloorPlan = (floorPlanId: string | null) => {
      if (floorPlanId === shownPlan) return;
      shownPlan = floorPlanId;
      void reloadFloorPlan().catch(() => (shownPlan = null));
    };
    openLayout({ layoutId, userId, onFloorPlan }).then(
      (next) => {
        if (left) return next.close();
        current = next;
        shownPlan = next.layout.floorPlanId;
        setFloorPlan(next.layout.floorPlan);
        setTrouble(null);
        setOpened(next);
      },
      (error: unknown) => {
        if (!left) setTrouble(sayError(error));
      },
    );
    return () => {
      left = true;
      current?.close();
      setOpened(null);
    };
  }, [layoutId, userId, attempt, reloadFloorPlan]);

  const chooseFloorPlan = useCallback(
    async (floorPlanId: string | null) => {
      await send('PATCH', `/api/layouts/${encodeURIComponent(layoutId)}`, { floorPlanId });
      await reloadFloorPlan();
    },
    [layoutId, reloadFloorPlan],
  );

  const tryAgain = useCallback(() => {
    setTrouble(null);
    setAttempt((count) => count + 1);
  }, []);

  const board = useMemo(
    () => opened && { ...opened, floorPlan, chooseFloorPlan },
    [opened, floorPlan, chooseFloorPlan],
  );
  return { board, trouble, tryAgain };
}

/** One part of the sheet's state. `select` picks a field: it must answer the same object as long as the sheet holds it. */
export function useSheet<T>({ sheet }: Pick<OpenLayout, 'sheet'>, select: (state: SheetState) => T): T {
  const read = () => select(sheet.getState());
  return useSyncExternalStore(sheet.subscribe, read, read);
}

export function useMapSettings({ settings }: Pick<OpenLayout, 'settings'>): MapSettings {
  return useSyncExternalStore(settings.subscribe, settings.getSettings, settings.getSettings);
}

/** Saved, saving, offline, conflict or refused: of the items and the settings together. */
export function useSaveStatus({ autosave, settings }: Pick<OpenLayout, 'autosave' | 'settings'>): SaveStatus {
  const items = useSyncExternalStore(autosave.subscribe, autosave.getStatus, autosave.getStatus);
  const map = useSyncExternalStore(settings.subscribe, settings.getStatus, settings.getStatus);
  return worstOf(items, map);
}
