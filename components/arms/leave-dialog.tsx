'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';

/** Before unsaved edits are left behind. */
export function LeaveDialog({ open, onStay, onLeave }: { open: boolean; onStay: () => void; onLeave: () => void }) {
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onStay()}
      title="Leave without saving?"
      description="What you changed on this arm is not saved yet."
      footer={
        <>
          <Button variant="danger" onClick={onLeave}>
            Leave and let it go
          </Button>
          <Button variant="action" onClick={onStay}>
            Stay here
          </Button>
        </>
      }
    />
  );
}
