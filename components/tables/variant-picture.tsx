'use client';

import { usePalette } from '@/components/sheet/drawing/use-palette';
import type { LayoutSummary } from '@/lib/contracts/layouts';

const WIDTH_PX = 96;
const HEIGHT_PX = 60;

/** What stands where on a variant, small. Its name says what it is, so the picture itself is silent. */
export function VariantPicture({ layout }: { readonly layout: Pick<LayoutSummary, 'id' | 'version'> }) {
  const { board } = usePalette();
  const query = `width=${WIDTH_PX}&board=${board}&version=${layout.version}`;
  return (
    // The server draws it at the size that is shown; nothing is left to optimise.
    // eslint-disable-next-line @next/next/no-img-element -- the picture comes from a route behind the session, in the right size
    <img
      src={`/api/layouts/${encodeURIComponent(layout.id)}/thumbnail?${query}`}
      width={WIDTH_PX}
      height={HEIGHT_PX}
      alt=""
      loading="lazy"
      className="border border-hair max-sm:hidden"
    />
  );
}
