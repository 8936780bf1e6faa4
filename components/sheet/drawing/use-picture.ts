'use client';

import { useEffect, useState } from 'react';

/** A picture, once it is there; keeps showing the last one while a sharper one loads, and null after a failure at the first. */
export function usePicture(url: string | null): HTMLImageElement | null {
  const [picture, setPicture] = useState<HTMLImageElement | null>(null);
  useEffect(() => {
    let wanted = true;
    if (!url) {
      setPicture(null);
      return;
    }
    const image = new Image();
    image.decoding = 'async';
    image.src = url;
    image
      .decode()
      .then(() => wanted && setPicture(image))
      .catch(() => undefined);
    return () => {
      wanted = false;
    };
  }, [url]);
  return picture;
}
