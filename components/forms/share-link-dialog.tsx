'use client';

import { useState } from 'react';
import { Dialog } from '@/components/ui/dialog';
import { NewShareLinkForm } from './new-share-link-form';
import { ShareLinkList } from './share-link-list';
import { ShareLinkAddress } from './share-link-address';

interface ShareLinkDialogProps {
  revisionId: string;
  /** How the revision is called, for the title. */
  revisionName: string;
  onClose: () => void;
}

/** Makes, shows and revokes the links to one revision. A new link's address is shown this once. Mount it to open it. */
export function ShareLinkDialog({ revisionId, revisionName, onClose }: ShareLinkDialogProps) {
  const [address, setAddress] = useState<string | null>(null);
  return (
    <Dialog open wide onOpenChange={(open) => !open && onClose()} title={`Share ${revisionName}`}>
      {address ? (
        <ShareLinkAddress address={address} onAnother={() => setAddress(null)} />
      ) : (
        <NewShareLinkForm revisionId={revisionId} onMade={setAddress} />
      )}
      <ShareLinkList revisionId={revisionId} />
    </Dialog>
  );
}
