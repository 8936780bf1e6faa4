'use client';

import { Tabs } from 'radix-ui';
import type { ReactNode } from 'react';
import { useBoard, useView } from './board-context';

interface NarrowDrawerProps {
  readonly tabs: readonly { readonly id: string; readonly label: ReactNode; readonly panel: ReactNode }[];
}

/** On a phone the panels are a drawer under the canvas: a tab opens its panel, pressing it again gives the room back. Tabs wrap. */
export function NarrowDrawer({ tabs }: NarrowDrawerProps) {
  const { view } = useBoard();
  const { side: open } = useView();
  const setOpen = view.openSide;
  return (
    <Tabs.Root
      value={open}
      onValueChange={setOpen}
      activationMode="manual"
      className="flex-none border-t-2 border-rule"
    >
      <Tabs.List aria-label="Panels of the sheet" className="grid grid-cols-5">
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
            className="min-h-11 border-t border-l border-hair px-1 text-sm [&:nth-child(-n+5)]:border-t-0 [&:nth-child(5n+1)]:border-l-0 focus-visible:-outline-offset-2 data-[state=active]:bg-ink data-[state=active]:text-sheet"
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
