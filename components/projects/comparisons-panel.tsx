'use client';

import { Button } from '@/components/ui/button';
import { TextLink } from '@/components/ui/link-button';
import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import { useMayActAs } from '@/lib/client/account-context';
import { comparisonPath, useComparisonActions, useComparisons } from '@/lib/client/use-comparisons';

/** The comparisons that were kept; nothing where there are none. */
export function ComparisonsPanel({ projectId }: { readonly projectId: string }) {
  const { data } = useComparisons(projectId);
  const { drop } = useComparisonActions(projectId);
  const mayDrop = useMayActAs('planner');
  if (!data || data.comparisons.length === 0) return null;
  return (
    <Panel title="Comparisons kept">
      <ul>
        {data.comparisons.map((comparison) => (
          <li
            key={comparison.id}
            className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1 border-t border-hair px-3.5 py-2 first:border-t-0"
          >
            <span>
              <TextLink href={comparisonPath(projectId, comparison)}>{comparison.name}</TextLink>{' '}
              <span className="text-sm text-ink-soft">
                {comparison.createdBy}, <Moment iso={comparison.createdAt} />
              </span>
            </span>
            {mayDrop && (
              <Button
                size="small"
                variant="quiet"
                aria-label={`Take away ${comparison.name}`}
                onClick={() => void drop(comparison.id)}
              >
                Take away
              </Button>
            )}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
