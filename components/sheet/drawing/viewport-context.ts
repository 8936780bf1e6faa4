import { createContext, useContext } from 'react';
import type { Viewport } from '@/lib/layout/viewport';

export interface StageFrame {
  readonly viewport: Viewport;
  readonly width: number;
  readonly height: number;
}

const StageFrameContext = createContext<StageFrame | null>(null);
export const StageFrameProvider = StageFrameContext.Provider;

/** The stage's size in px and what it shows. Changes with every pan, so only what depends on it should ask. */
export function useStageFrame(): StageFrame {
  const frame = useContext(StageFrameContext);
  if (!frame) throw new Error('Drawing layers belong inside a SheetStage.');
  return frame;
}
