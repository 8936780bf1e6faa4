'use client';

import { Ellipsis } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useState, type ReactNode } from 'react';
import { NameDialog } from '@/components/forms/name-dialog';
import { Button } from '@/components/ui/button';
import { Menu, MenuItem } from '@/components/ui/menu';
import { toast } from '@/components/ui/toaster';
import { useMayActAs } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { useArmActions } from '@/lib/client/use-arms';
import type { LibraryArm } from '@/lib/contracts/arms';
import { downloadTable } from './download-table';

/** What can be done with a stored version: copy it, take it out as a table, put the arm away. */
export function ArmActions({ arm, children }: { arm: LibraryArm; children?: ReactNode }) {
  const router = useRouter();
  const actions = useArmActions();
  const mayChange = useMayActAs('integrator');
  const [copying, setCopying] = useState(false);
  const isArchived = arm.archivedAt !== null;
  const archive = async (): Promise<void> => {
    try {
      await actions.setArchived(arm.id, !isArchived);
      toast.success(
        isArchived ? `${arm.name} is back in the library` : `${arm.name} is archived. Layouts that use it keep it.`,
      );
    } catch (error) {
      toast.error(sayError(error));
    }
  };
  return (
    <>
      {mayChange && (
        <Button variant="quiet" className="max-sm:hidden" onClick={() => setCopying(true)}>
          Copy
        </Button>
      )}
      {children}
      <Menu
        trigger={
          <Button variant="quiet" size="icon" aria-label="More for this arm">
            <Ellipsis aria-hidden className="size-4" />
          </Button>
        }
      >
        {mayChange && <MenuItem onSelect={() => setCopying(true)}>Copy this arm</MenuItem>}
        <MenuItem onSelect={() => downloadTable(arm)}>Export version {arm.version} as CSV</MenuItem>
        {mayChange && (
          <MenuItem danger={!isArchived} onSelect={() => void archive()}>
            {isArchived ? 'Bring back into the library' : 'Archive'}
          </MenuItem>
        )}
      </Menu>
      {copying && (
        <NameDialog
          title="Copy this arm"
          label="Name of the copy"
          start={`${arm.name}, copy`.slice(0, 120)}
          onClose={() => setCopying(false)}
          onSubmit={async (name) => {
            const copy = await actions.copy(arm.id, name);
            router.push(`/arms/${copy.id}`);
          }}
        />
      )}
    </>
  );
}
