'use client';

import { mapSettingsSchema, type MapSettings } from '@/lib/layout/map-settings';
import { useBoard } from './board-context';

/** Changes what the map asks; answers `refusal` where the values cannot be, and then nothing changes. */
export function useSettingChange(): (patch: Partial<MapSettings>, refusal: string) => string | null {
  const { settings: keeper } = useBoard();
  return (patch, refusal) => {
    if (!mapSettingsSchema.safeParse({ ...keeper.getSettings(), ...patch }).success) return refusal;
    keeper.change(patch);
    return null;
  };
}
