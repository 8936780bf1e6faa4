'use client';

import { Tabs } from 'radix-ui';
import { useState, type ReactNode } from 'react';

interface NarrowDrawerProps {
  readonly tabs: readonly { readonly id: string; readonly label: string; readonly panel: ReactNode }[];
}

/** On a phone the panels are a drawer under the canvas: a tab opens its panel, pressing it again gives the room back. */
export function NarrowDrawer({ tabs }: NarrowDrawerProps) {
  const [open, setOpen] = useState('');
  return (
    <Tabs.Root
      value={open}
      onValueChange={setOpen}
      activationMode="manual"
      className="flex-none border-t-2 border-rule"
    >
      <Tabs.List aria-label="Panels of the sheet" className="flex overflow-x-auto">
        {tabs.map(({ id, label }) => (
          <Tabs.Trigger
            key={id}
            value={id}
            onPointerDown={(event) => {
              if (open !== id) return;
              // The tab would be chosen again by this very press.
              event.preventDefault();
              setOpen('');
            }}
            className="min-h-11 flex-auto border-l border-hair px-2 text-sm first:border-l-0 focus-visible:-outline-offset-2 data-[state=active]:bg-ink data-[state=active]:text-sheet"
          >
            {label}
          </Tabs.Trigger>
        ))}
      </Tabs.List>
      {tabs.map(({ id, panel }) => (
        <Tabs.Content key={id} value={id} className="max-h-[42dvh] overflow-y-auto border-t border-rule">
          {panel}
        </Tabs.Content>
      ))}
    </Tabs.Root>
  );
}
