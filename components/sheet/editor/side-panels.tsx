'use client';

import type { ComponentType } from 'react';
import { CyclePanel } from '@/components/sheet/judging/cycle-panel';
import { Inspector } from '@/components/sheet/panels/inspector';
import { PlumbPanel } from '@/components/sheet/panels/plumb-panel';
import { VerdictTable } from '@/components/sheet/panels/verdict-table';
import { DistancesPanel } from '@/components/sheet/studies/distances-panel';
import { StudiesPanel } from '@/components/sheet/studies/studies-panel';
import { BoardRemarks, useOpenRemarks } from './board-remarks';
import { NARROW, useMedia } from './use-media';

export interface SidePanel {
  /** Stands in `view.openSide(id)` too, for whoever wants to bring a panel to the front. */
  readonly id: string;
  /** One short word: the tabs share 326 px, and wrap onto a second row where they do not fit. */
  readonly label: string;
  /** Takes what it needs from the board's contexts. It is mounted only while its tab is open. */
  readonly Panel: ComponentType;
  /** A hook: how many things in there wait for somebody; the number stands on the tab. */
  readonly useWaiting?: () => number;
  /** On a wide page these stand one under another in the first tab; on a phone each has a tab of its own. */
  readonly isReading?: boolean;
}

/** The panels beside the sheet, in the order of their tabs. A new one is a line here. */
export const SIDE_PANELS: readonly SidePanel[] = [
  { id: 'values', label: 'Values', Panel: Values, isReading: true },
  { id: 'plumb', label: 'Plumb', Panel: PlumbPanel, isReading: true },
  { id: 'points', label: 'Points', Panel: VerdictTable, isReading: true },
  { id: 'cycle', label: 'Cycle', Panel: CyclePanel },
  { id: 'studies', label: 'Studies', Panel: StudiesPanel },
  { id: 'distances', label: 'Distances', Panel: DistancesPanel },
  { id: 'remarks', label: 'Remarks', Panel: BoardRemarks, useWaiting: useOpenRemarks },
];

/** With other readings below it nothing needs to be said while nothing is chosen; alone in a drawer it does. */
function Values() {
  return <Inspector emptyWords={useMedia(NARROW)} />;
}
