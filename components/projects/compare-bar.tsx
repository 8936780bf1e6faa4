'use client';

import { useState } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { Select } from '@/components/ui/select';
import type { LayoutSummary } from '@/lib/contracts/layouts';

interface CompareBarProps {
  projectId: string;
  /** At least two. */
  layouts: readonly LayoutSummary[];
}

/** Picks two variants and opens them side by side. */
export function CompareBar({ projectId, layouts }: CompareBarProps) {
  const [left, setLeft] = useState(layouts[0]?.id);
  const [right, setRight] = useState(layouts[1]?.id);
  const options = (other: string | undefined) =>
    layouts.map((layout) => ({
      value: layout.id,
      label: `${layout.letter} · ${layout.name}`,
      disabled: layout.id === other,
    }));
  return (
    <div className="flex flex-wrap items-center gap-2 border-t border-rule px-3.5 py-2.5 text-sm">
      <span className="text-ink-soft">Compare</span>
      <Select
        aria-label="Left sheet"
        value={left}
        onValueChange={setLeft}
        options={options(right)}
        className="w-auto! max-w-56"
      />
      <span className="text-ink-soft">with</span>
      <Select
        aria-label="Right sheet"
        value={right}
        onValueChange={setRight}
        options={options(left)}
        className="w-auto! max-w-56"
      />
      <LinkButton href={`/projects/${projectId}/compare?left=layout:${left}&right=layout:${right}`}>
        Side by side
      </LinkButton>
    </div>
  );
}
