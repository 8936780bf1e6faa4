'use client';

import { Button } from '@/components/ui/button';
import { Progress } from '@/components/ui/progress';
import type { MapWork } from './types';

interface WorkLineProps {
  readonly work: MapWork;
  readonly onAsk?: () => void;
  readonly onCancel?: () => void;
  readonly onRetry?: () => void;
}

/** What keeps the map away and what can be done about it, in one or two lines. */
export function WorkLine({ work, onAsk, onCancel, onRetry }: WorkLineProps) {
  switch (work.kind) {
    case 'none':
      return null;
    case 'noRobots':
      return <Line words="Place a robot on the floor, and its map is drawn here." />;
    case 'notAsked':
      return (
        <Line
          words="No map has been asked for yet."
          action={onAsk && { label: 'Ask for the map', run: onAsk, strong: true }}
        />
      );
    case 'cancelled':
      return <Line words="The map was cancelled." action={onRetry && { label: 'Ask again', run: onRetry }} />;
    case 'queued':
      return (
        <Line words="The map is waiting for its turn." action={onCancel && { label: 'Cancel', run: onCancel }} polite />
      );
    case 'running':
      return (
        <Progress
          label="Computing the map"
          share={work.total > 0 ? work.done / work.total : 0}
          action={
            onCancel && (
              <Button variant="quiet" size="small" onClick={onCancel}>
                Cancel
              </Button>
            )
          }
        />
      );
    case 'failed':
      return <Line words={work.reason} trouble action={onRetry && { label: 'Try again', run: onRetry }} />;
  }
}

interface LineProps {
  readonly words: string;
  readonly trouble?: boolean;
  readonly polite?: boolean;
  readonly action?: { readonly label: string; readonly run: () => void; readonly strong?: boolean };
}

function Line({ words, trouble = false, polite = false, action }: LineProps) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-2 text-sm">
      <p
        role={trouble ? 'alert' : polite ? 'status' : undefined}
        className={trouble ? 'font-medium text-red' : undefined}
      >
        {words}
      </p>
      {action && (
        <Button variant={action.strong ? 'action' : 'plain'} size="small" onClick={action.run}>
          {action.label}
        </Button>
      )}
    </div>
  );
}
