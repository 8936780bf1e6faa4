'use client';

import { useOthers } from '@/lib/client/use-others';
import { useBoard } from './board-context';

/** Who else has this sheet open. Read aloud as somebody comes or goes. */
export function WhoElse() {
  const names = [...new Set(useOthers(useBoard()).map(({ name }) => name))];
  const words =
    names.length === 0
      ? ''
      : names.length === 1
        ? `${names[0]} is here too`
        : `${names.slice(0, -1).join(', ')} and ${names.at(-1)} are here too`;
  return (
    <span role="status" className="mr-1 ml-auto max-w-72 truncate pl-2 text-sm text-ink-soft" title={words}>
      {words}
    </span>
  );
}
