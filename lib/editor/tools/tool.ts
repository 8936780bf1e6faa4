import type { Change, Items } from '../changes';
import type { Grip } from '../grips';
import type { Moved } from '../snap-lines';
import type { Snapping } from '../snapping';
import type { Item } from '@/lib/layout/items';
import type { PointMm } from '@/lib/layout/geometry';

/** What is chosen on the sheet: items, and at most one task point of a chosen fixture. */
export interface Selection {
  readonly itemIds: readonly string[];
  readonly taskPointId: string | null;
}

export const NOTHING: Selection = { itemIds: [], taskPointId: null };
export const chosen = (...itemIds: string[]): Selection => ({ itemIds, taskPointId: null });

/** What lies under the pointer. */
export type Target =
  | { readonly part: 'item'; readonly itemId: string }
  | { readonly part: 'taskPoint'; readonly itemId: string; readonly taskPointId: string }
  /** The handle that turns the chosen items. */
  | { readonly part: 'turn'; readonly itemId: string }
  /** A corner, an end or a knob of the chosen item. */
  | { readonly part: 'grip'; readonly itemId: string; readonly grip: Grip };

/** A pointer on the floor. */
export interface Press {
  readonly xMm: number;
  readonly yMm: number;
  readonly target: Target | null;
  /** Shift: adds to the selection, keeps a move level or upright. */
  readonly shift: boolean;
  /** Alt: snapping is suspended. */
  readonly alt: boolean;
  /** What a few pixels are on the floor, so that a shaky click is no drag. */
  readonly slackMm: number;
}

/** The sheet as a tool sees it. */
export interface View {
  readonly items: Items;
  readonly selection: Selection;
  readonly snapping: Snapping;
  readonly newId: () => string;
  /**
   * Where a spot of the floor falls to: what is near of items and floor plan, else the grid; nowhere while Alt is held. What it
   * fell to is shown as guides until the next move. `moved` is what is being moved, which does not snap to itself.
   */
  snap(wanted: FloorSpot, press: Pick<Press, 'alt' | 'slackMm'>, moved?: Moved | null): FloorSpot;
}

interface FloorSpot {
  readonly xMm: number;
  readonly yMm: number;
}

/** What a gesture shows before it is done. It is drawn over the sheet, never saved; dropping it is the whole of cancelling. */
export interface Draft {
  /** Items as they would become; ids that the sheet lacks are new ones. */
  readonly items: readonly Item[];
  readonly marquee?: { readonly from: PointMm; readonly to: PointMm };
}

export interface Reply {
  /** The state that the tool is in from here. */
  readonly tool: Tool;
  readonly draft?: Draft | null;
  readonly selection?: Selection;
  /** A finished gesture: one step of the history. */
  readonly step?: { readonly label: string; readonly changes: readonly Change[] };
  /** The plumb was dropped or drawn to this spot. */
  readonly plumb?: { readonly xMm: number; readonly yMm: number };
  /** Something to say that is no step: why nothing was placed. */
  readonly say?: string;
}

export type ToolName =
  | 'select'
  | 'carry'
  | 'outline'
  | 'pan'
  | 'robot'
  | 'fixture'
  | 'ownFixture'
  | 'obstacle'
  | 'column'
  | 'guardLine'
  | 'walkway'
  | 'conveyor'
  | 'zone'
  | 'protectiveDevice'
  | 'note'
  | 'taskPoint'
  | 'dimension'
  | 'sectionLine'
  | 'plumb';

/**
 * A tool in one of its states. States are small and immutable: each takes its snapshot when it is entered and answers the
 * state that follows. `cancel` answers the state that the tool rests in.
 */
export interface Tool {
  readonly name: ToolName;
  /** What to do next, in words, for the line under the sheet. */
  readonly hint: string;
  /** True while Escape has something to take back. */
  readonly busy: boolean;
  press(at: Press, view: View): Reply;
  move(at: Press, view: View): Reply;
  release(at: Press, view: View): Reply;
  /** Enter or a double click: ends a line. */
  finish(view: View): Reply;
  /** Delete, where the tool holds something that can be taken away; otherwise what is chosen goes. */
  readonly remove?: () => Reply;
  cancel(): Tool;
  /** The press was taken away (a second finger, the system): the state before it. */
  interrupted(): Tool;
}

/** A tool state that answers nothing but what it is given. */
export function state(name: ToolName, hint: string, own: Partial<Omit<Tool, 'name' | 'hint'>> = {}): Tool {
  const self: Tool = {
    name,
    hint,
    busy: false,
    press: () => ({ tool: self }),
    move: () => ({ tool: self }),
    release: () => ({ tool: self }),
    finish: () => ({ tool: self }),
    cancel: () => self,
    interrupted: () => (name === 'select' ? self.cancel() : self),
    ...own,
  };
  return self;
}
