'use client';

import { useEffect } from 'react';

const DRAWN_FONTS = [
  '600 12px "Barlow Semi Condensed"',
  '500 12px "Barlow Semi Condensed"',
  '500 12px "Sometype Mono"',
];

/** Calls back once the lettering's fonts are there: a canvas, unlike a page, does not letter again by itself. */
export function useFontsReady(ready: () => void): void {
  useEffect(() => {
    let wanted = true;
    if (!document.fonts) return;
    void Promise.allSettled(DRAWN_FONTS.map((font) => document.fonts.load(font))).then(() => {
      if (wanted) ready();
    });
    return () => {
      wanted = false;
    };
  }, [ready]);
}
