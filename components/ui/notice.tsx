import type { ReactNode } from 'react';
import { classNames } from './class-names';

export type NoticeTone = 'note' | 'caution' | 'trouble' | 'met';

const TONES: Record<NoticeTone, string> = {
  note: 'border-l-petrol',
  caution: 'border-l-amber',
  trouble: 'border-l-red text-red font-medium',
  met: 'border-l-green',
};

interface NoticeProps {
  tone?: NoticeTone;
  title?: ReactNode;
  action?: ReactNode;
  className?: string;
  children?: ReactNode;
}

/** A few plain words that stay on the page: what is so, or what is wrong and what to do. Trouble is announced at once. */
export function Notice({ tone = 'note', title, action, className, children }: NoticeProps) {
  return (
    <div
      role={tone === 'trouble' ? 'alert' : 'status'}
      className={classNames(
        'flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border border-l-4 border-hair bg-sheet px-3 py-2',
        TONES[tone],
        className,
      )}
    >
      <div className="min-w-0 flex-1 basis-48">
        {title && <p className="font-semibold">{title}</p>}
        {children}
      </div>
      {action}
    </div>
  );
}
