'use client';

import { useSyncExternalStore } from 'react';
import type { OtherPlanner } from '@/lib/contracts/presence';
import type { OpenLayout } from './open-layout';

/** The other planners on an open layout, with their cursors. */
export function useOthers({ presence }: Pick<OpenLayout, 'presence'>): readonly OtherPlanner[] {
  return useSyncExternalStore(presence.subscribe, presence.getOthers, presence.getOthers);
}
