'use client';

import { Tabs } from 'radix-ui';
import { useBoard, useView } from './board-context';
import { SIDE_PANELS, type SidePanel } from './side-panels';

/** The first tab of a wide page; the panels in it are also known by their own ids. */
const READINGS = 'readings';
const READING_PANELS = SIDE_PANELS.filter(({ isReading }) => isReading);

export const SIDE_TABS: readonly {
  readonly id: string;
  readonly label: string;
  readonly panels: readonly SidePanel[];
}[] = [
  { id: READINGS, label: 'Readings', panels: READING_PANELS },
  ...SIDE_PANELS.filter(({ isReading }) => !isReading).map((panel) => ({ ...panel, panels: [panel] })),
];

const tabOf = (side: string): string =>
  SIDE_TABS.find(({ id, panels }) => id === side || panels.some((panel) => panel.id === side))?.id ?? READINGS;

/** The right side of a wide page: a row of tabs, wrapped where they do not fit, arrows walk them. */
export function SideTabs() {
  const { view } = useBoard();
  const { side } = useView();
  return (
    <aside aria-label="Values and readings" className="flex w-[326px] flex-none flex-col border-l border-rule">
      <Tabs.Root value={tabOf(side)} onValueChange={view.openSide} className="flex min-h-0 flex-1 flex-col">
        <Tabs.List aria-label="Panels of the sheet" className="flex flex-none flex-wrap border-b border-rule">
          {SIDE_TABS.map(({ id, label, panels }) => (
            <Tabs.Trigger
              key={id}
              value={id}
              className="-mb-px min-h-9 flex-auto border-b-2 border-transparent px-2 text-sm text-ink-soft hover:text-ink focus-visible:-outline-offset-2 data-[state=active]:border-petrol data-[state=active]:font-medium data-[state=active]:text-ink"
            >
              <TabLabel label={label} useWaiting={panels[0].useWaiting} />
            </Tabs.Trigger>
          ))}
        </Tabs.List>
        {SIDE_TABS.map(({ id, panels }) => (
          <Tabs.Content
            key={id}
            value={id}
            // Its panels hold what the keyboard goes to; an extra stop before them says nothing.
            tabIndex={-1}
            className="min-h-0 flex-1 overflow-y-auto"
          >
            {panels.map(({ id: panelId, Panel }) => (
              <Panel key={panelId} />
            ))}
          </Tabs.Content>
        ))}
      </Tabs.Root>
    </aside>
  );
}

const NONE = () => 0;

/** The word on a tab, with the number of things that wait behind it. */
export function TabLabel({ label, useWaiting = NONE }: Pick<SidePanel, 'label' | 'useWaiting'>) {
  const waiting = useWaiting();
  return (
    <>
      {label}
      {waiting > 0 && <span className="ml-1 font-mono text-[0.8125rem] text-red">{waiting}</span>}
    </>
  );
}
