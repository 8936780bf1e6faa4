import type { ReactNode } from 'react';
import { classNames } from './class-names';

export type TagTone = 'roomy' | 'fair' | 'tight' | 'pinned' | 'out' | 'neutral';

const TONES: Record<TagTone, string> = {
  roomy: 'border-green text-green',
  fair: 'border-petrol text-petrol',
  tight: 'border-amber text-amber',
  pinned: 'border-red text-red',
  out: 'border-red text-red',
  neutral: 'border-ink-soft text-ink-soft',
};

/** A verdict or a state in one or two words; the words carry it, the colour repeats it. */
export function Tag({
  tone = 'neutral',
  className,
  children,
}: {
  tone?: TagTone;
  className?: string;
  children: ReactNode;
}) {
  return (
    <span
      className={classNames(
        'inline-flex items-center rounded border px-1.5 text-[0.8125rem] leading-[1.15rem] font-medium whitespace-nowrap',
        TONES[tone],
        className,
      )}
    >
      {children}
    </span>
  );
}
