'use client';

import { Link2, Printer } from 'lucide-react';
import { useState } from 'react';
import { toast } from 'sonner';
import { NameDialog } from '@/components/forms/name-dialog';
import { Button } from '@/components/ui/button';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { comparisonPath, useComparisonActions } from '@/lib/client/use-comparisons';
import type { ComparisonView } from '@/lib/contracts/comparisons';

export type CompareLook = 'beside' | 'swipe';

interface CompareToolsProps {
  readonly projectId: string;
  /** What it is called unless somebody writes another name. */
  readonly name: string;
  readonly sheets: readonly string[];
  readonly view: ComparisonView;
  readonly look: CompareLook;
  readonly onLookChange: (look: CompareLook) => void;
  readonly mayKeep: boolean;
}

/** How the sheets lie, and what is done with the comparison: keep it, send its address, print it. */
export function CompareTools({ projectId, name, sheets, view, look, onLookChange, mayKeep }: CompareToolsProps) {
  const { keep } = useComparisonActions(projectId);
  const [isKeeping, setKeeping] = useState(false);
  const copy = async () => {
    const address = new URL(comparisonPath(projectId, { sheets: [...sheets], view }), window.location.origin).href;
    try {
      await navigator.clipboard.writeText(address);
      toast.success('Address copied. Whoever can see this project can open it.');
    } catch {
      // Browsers refuse the clipboard outside https and without permission.
      toast.error('The browser did not let us copy. Copy the address from its bar.');
    }
  };
  return (
    <div className="flex flex-wrap items-center justify-between gap-2 print:hidden">
      <SegmentedControl
        label="How the sheets lie"
        value={look}
        onValueChange={onLookChange}
        options={[
          { value: 'beside', label: 'Side by side' },
          { value: 'swipe', label: 'Swipe' },
        ]}
      />
      <div className="flex flex-wrap gap-2">
        {mayKeep && <Button onClick={() => setKeeping(true)}>Keep</Button>}
        <Button onClick={() => void copy()}>
          <Link2 aria-hidden className="size-4" />
          Copy the address
        </Button>
        <Button onClick={() => window.print()}>
          <Printer aria-hidden className="size-4" />
          Print
        </Button>
      </div>
      {isKeeping && (
        <NameDialog
          title="Keep this comparison"
          label="Name"
          start={name}
          onClose={() => setKeeping(false)}
          onSubmit={async (kept) => {
            await keep({ name: kept, sheets: [...sheets], view });
            toast.success('Kept. It is listed on the project page.');
          }}
        />
      )}
    </div>
  );
}
