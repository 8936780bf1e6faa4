'use client';

import { useCallback, useState } from 'react';

export interface Size {
  width: number;
  height: number;
}

/** The size of an element in CSS px, followed; null before it is on the page. Give the function to its `ref`. */
export function useSize(): [(element: HTMLElement | null) => (() => void) | undefined, Size | null] {
  const [size, setSize] = useState<Size | null>(null);
  const watch = useCallback((element: HTMLElement | null) => {
    if (!element) return undefined;
    const observer = new ResizeObserver(() => {
      const { clientWidth: width, clientHeight: height } = element;
      if (width > 0 && height > 0)
        setSize((last) => (last?.width === width && last.height === height ? last : { width, height }));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [watch, size];
}
