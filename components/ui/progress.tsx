import { Progress as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

interface ProgressProps {
  /** Read aloud and drawn over the bar. */
  label: string;
  /** Share done, 0 … 1. */
  share: number;
  /** A cancel button, for example. */
  action?: ReactNode;
}

/** How far a long piece of work has come. */
export function Progress({ label, share, action }: ProgressProps) {
  const percent = Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <div className="min-w-0">
      <div className="mb-1 flex items-center justify-between gap-3 text-sm">
        <span className="min-w-0 truncate">{label}</span>
        <span className="flex items-center gap-2">
          <span className="font-mono tabular-nums">{percent}%</span>
          {action}
        </span>
      </div>
      <Primitive.Root value={percent} aria-label={label} className="h-1.5 overflow-hidden border border-rule bg-sheet">
        <Primitive.Indicator className="h-full bg-petrol transition-[width]" style={{ width: `${percent}%` }} />
      </Primitive.Root>
    </div>
  );
}
