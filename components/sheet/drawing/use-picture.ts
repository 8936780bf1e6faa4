'use client';

import { useEffect, useState } from 'react';

/** A picture, once it is there. Keeps showing the last one while another loads; null before the first and where it fails. */
export function usePicture(url: string | null): HTMLImageElement | null {
  const [picture, setPicture] = useState<HTMLImageElement | null>(null);
  useEffect(() => {
    if (!url) return;
    let wanted = true;
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
  return url ? picture : null;
}
