'use client';

import { OutlineFields } from '@/components/sheet/panels/outline-fields';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { SegmentedControl } from '@/components/ui/segmented-control';
import type { Zone } from '@/lib/layout/items';

/** What a zone is for, and its outline. */
export function ZoneFields({ item }: { readonly item: Zone }) {
  const edit = useItemEdit(item);
  return (
    <>
      <SegmentedControl
        label="What the zone is for"
        className="mt-2"
        value={item.use}
        disabled={item.locked}
        onValueChange={(use) => edit('Use', { use })}
        options={[
          { value: 'keepOut', label: 'No base here' },
          { value: 'shared', label: 'One robot at a time' },
        ]}
      />
      <OutlineFields item={item} />
    </>
  );
}
