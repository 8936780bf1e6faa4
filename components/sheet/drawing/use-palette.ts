'use client';

import { useSyncExternalStore } from 'react';
import { DAY_PALETTE, PRINT_PALETTE, readPalette, type Palette } from '@/lib/layout/palette';
import type { DrawingMode } from './types';

function watchBoard(changed: () => void): () => void {
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-board'] });
  return () => observer.disconnect();
}

/** The colours of the present board; follows the board when it changes. Print stays on white paper. */
export function usePalette(mode: DrawingMode = 'edit'): Palette {
  const palette = useSyncExternalStore(watchBoard, readPalette, () => DAY_PALETTE);
  return mode === 'print' ? PRINT_PALETTE : palette;
}
