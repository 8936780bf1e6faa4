'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import type { LibraryArm } from '@/lib/contracts/arms';
import { armDifferences } from '@/lib/layout/arm-differences';
import { DifferenceList } from './versions-panel';

interface StaleDialogProps {
  /** The version that was edited, and the one that somebody saved meanwhile. */
  base: LibraryArm;
  newest: LibraryArm;
  onKeep: () => void;
  onTake: () => void;
  onClose: () => void;
}

/** When somebody else was quicker: shows what they changed and leaves the choice. */
export function StaleDialog({ base, newest, onKeep, onTake, onClose }: StaleDialogProps) {
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Version ${newest.version} was saved meanwhile`}
      description={`You edited version ${base.version}. Since then this changed:`}
      footer={
        <>
          <Button variant="plain" onClick={onTake}>
            Let mine go, open version {newest.version}
          </Button>
          <Button variant="action" onClick={onKeep}>
            Save mine as version {newest.version + 1}
          </Button>
        </>
      }
    >
      <DifferenceList lines={armDifferences(base, newest)} />
      <p className="mt-3">
        Yours would stand on top of it as you have it here. Version {newest.version} stays in the list either way.
      </p>
    </Dialog>
  );
}
