'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { sayError } from '@/lib/client/fetcher';
import type { Review } from '@/lib/client/use-review';
import type { Remark } from '@/lib/contracts/remarks';

interface SettleButtonProps {
  readonly remark: Remark;
  readonly settle: NonNullable<Review['settle']>;
}

/** Settles a remark, or opens it again. */
export function SettleButton({ remark, settle }: SettleButtonProps) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const isSettled = remark.resolvedAt !== null;
  const run = async () => {
    setBusy(true);
    setFault(null);
    try {
      await settle(remark.id, !isSettled);
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <div>
      <Button size="small" busy={busy} onClick={() => void run()}>
        {isSettled ? 'Open again' : 'Settle this remark'}
      </Button>
      {fault && (
        <p role="alert" className="mt-1 text-sm text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
