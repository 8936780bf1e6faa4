import { CAUTIONS } from '@/lib/layout/protective/cautions';

/** Stands beside every figure of distances. */
export function Cautions() {
  return (
    <p className="mt-2 border-l-4 border-l-amber pl-2 text-[0.8125rem] leading-4.5 text-ink-soft" data-cautions>
      {CAUTIONS.join(' ')}
    </p>
  );
}
