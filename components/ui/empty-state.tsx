import type { ReactNode } from 'react';

interface EmptyStateProps {
  title: ReactNode;
  /** What stands here once there is something, and the next step. */
  body?: ReactNode;
  action?: ReactNode;
}

/** Nothing here yet: says the next step. */
export function EmptyState({ title, body, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 px-3.5 py-6">
      <div className="max-w-prose">
        <p className="text-base font-semibold">{title}</p>
        {body && <p className="mt-1 text-ink-soft">{body}</p>}
      </div>
      {action && <div className="flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}
