import type { ReactNode } from 'react';
import { printedFixed } from '@/lib/editor/measure-text';

/** Readings one under the other, figures at the right. */
export function ReadingList({ children }: { readonly children: ReactNode }) {
  return <dl className="mt-1.5 text-[0.9375rem] leading-[1.5rem]">{children}</dl>;
}

interface ReadingProps {
  readonly label: string;
  readonly value?: number | null;
  readonly digits?: number;
  readonly unit?: string;
  /** Instead of a number. */
  readonly words?: string;
}

export function Reading({ label, value = null, digits = 2, unit, words }: ReadingProps) {
  const figure = value === null || !Number.isFinite(value) ? '–' : printedFixed(value, digits);
  return (
    <div className="flex items-baseline justify-between gap-3">
      <dt>{label}</dt>
      <dd className="font-mono text-sm whitespace-nowrap tabular-nums">
        {words ?? figure}
        {unit && !words && figure !== '–' && ` ${unit}`}
      </dd>
    </div>
  );
}
