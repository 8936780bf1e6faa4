'use client';

import { useCallback, useSyncExternalStore } from 'react';

/** Whether a media query holds; false on the server. */
export function useMedia(query: string): boolean {
  const subscribe = useCallback(
    (listener: () => void) => {
      const list = window.matchMedia(query);
      list.addEventListener('change', listener);
      return () => list.removeEventListener('change', listener);
    },
    [query],
  );
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(query).matches,
    () => false,
  );
}

/** A page too narrow for panels beside the canvas: they are a drawer under it. */
export const NARROW = '(max-width: 1023px)';
