'use client';

import { Crosshair, Ellipsis, Pencil, Trash2 } from 'lucide-react';
import Image from 'next/image';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { NameDialog } from '@/components/forms/name-dialog';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Figure } from '@/components/ui/figure';
import { LinkButton, TextLink } from '@/components/ui/link-button';
import { Menu, MenuItem } from '@/components/ui/menu';
import { Tag } from '@/components/ui/tag';
import { toast } from '@/components/ui/toaster';
import { pictureUrl, useFloorPlanActions } from '@/lib/client/use-floor-plans';
import type { FloorPlan } from '@/lib/contracts/floor-plans';

const THUMBNAIL_PX = 320;

/** One floor plan: a small picture, whether it has a scale, and what can be done with it. */
export function FloorPlanRow({ floorPlan }: { floorPlan: FloorPlan }) {
  const router = useRouter();
  const actions = useFloorPlanActions(floorPlan.projectId);
  const [pending, setPending] = useState<'rename' | 'delete' | null>(null);
  const { calibration, name, widthPx, heightPx } = floorPlan;
  const href = `/projects/${floorPlan.projectId}/floor-plans/${floorPlan.id}`;
  return (
    <li className="flex items-center gap-3 border-t border-hair px-3.5 py-2.5 first:border-t-0">
      <Image
        unoptimized
        src={pictureUrl(floorPlan.id, THUMBNAIL_PX)}
        width={80}
        height={60}
        alt=""
        className="h-15 w-20 shrink-0 border border-hair bg-white object-contain"
      />
      <div className="min-w-0 flex-1">
        <TextLink href={href} className="block truncate font-medium">
          {name}
        </TextLink>
        <p className="font-mono text-[0.8125rem] text-ink-soft">
          {widthPx} × {heightPx} px
        </p>
        {calibration ? (
          <p className="flex flex-wrap items-center gap-x-2 text-sm text-ink-soft">
            <Tag tone="roomy">To scale</Tag>
            <Figure value={calibration.mmPerPx} decimals={3} unit="mm/px" className="text-[0.8125rem]" />
          </p>
        ) : (
          <Tag tone="tight">No scale yet</Tag>
        )}
      </div>
      {!calibration && (
        <LinkButton href={href} size="small" variant="action">
          Set to scale
        </LinkButton>
      )}
      <Menu
        trigger={
          <Button variant="quiet" size="icon" aria-label={`More for ${name}`}>
            <Ellipsis aria-hidden className="size-4" />
          </Button>
        }
      >
        <MenuItem icon={<Crosshair aria-hidden className="size-4" />} onSelect={() => router.push(href)}>
          {calibration ? 'Change the scale' : 'Set to scale'}
        </MenuItem>
        <MenuItem icon={<Pencil aria-hidden className="size-4" />} onSelect={() => setPending('rename')}>
          Rename
        </MenuItem>
        <MenuItem danger icon={<Trash2 aria-hidden className="size-4" />} onSelect={() => setPending('delete')}>
          Delete
        </MenuItem>
      </Menu>
      {pending === 'rename' && (
        <NameDialog
          title="Rename floor plan"
          label="Name"
          start={name}
          onClose={() => setPending(null)}
          onSubmit={async (next) => {
            await actions.change(floorPlan.id, { name: next });
          }}
        />
      )}
      <ConfirmDialog
        open={pending === 'delete'}
        onOpenChange={(open) => !open && setPending(null)}
        title="Delete this floor plan?"
        description={`“${name}” and its scale go for good. A floor plan that lies under a variant or an issued revision is kept.`}
        confirmLabel="Delete floor plan"
        danger
        onConfirm={async () => {
          await actions.remove(floorPlan.id);
          toast.success(`${name} is deleted`);
        }}
      />
    </li>
  );
}
