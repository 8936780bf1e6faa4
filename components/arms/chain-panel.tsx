import type { ReactNode } from 'react';
import { Figure } from '@/components/ui/figure';
import { Panel } from '@/components/ui/panel';
import type { ArmStudy } from './use-arm-study';

interface ChainPanelProps {
  study: ArmStudy;
  description?: string;
  children?: ReactNode;
}

/** How the chain is solved, what it controls, and how far and fast it goes. */
export function ChainPanel({ study: { facts, fastestMPerS }, description, children }: ChainPanelProps) {
  return (
    <Panel title="What the chain is" padded className="-mt-px">
      <div className="flex max-w-prose flex-col gap-1">
        {description && <p>{description}</p>}
        {facts && (
          <>
            <p>{facts.chain.method}</p>
            <p>{facts.chain.controls}</p>
            {facts.weighingLengthMm !== null && (
              <p>
                Best length to weigh turning against moving, as drawn:{' '}
                <Figure value={facts.weighingLengthMm} unit="mm" />.
              </p>
            )}
            <p>
              Reach from the first axis: <Figure value={facts.reachMm} unit="mm" />.{' '}
              {fastestMPerS !== null && (
                <>
                  Fastest tool speed in the section:{' '}
                  {fastestMPerS === undefined ? (
                    <span className="text-ink-soft">being worked out</span>
                  ) : (
                    <Figure value={fastestMPerS} decimals={1} unit="m/s" />
                  )}
                  .
                </>
              )}
            </p>
          </>
        )}
        {children}
      </div>
    </Panel>
  );
}

/** "Used in 4 layouts; their maps stay with the version that made them." */
export function UsedIn({ count }: { count: number }) {
  return (
    <p>
      Used in <strong className="font-semibold">{count === 1 ? '1 layout' : `${count} layouts`}</strong>; their maps
      stay with the version that made them.
    </p>
  );
}
