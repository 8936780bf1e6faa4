import type { LayoutChanges, Operation, OperationBatch, OperationResult, StoredItem } from '@/lib/contracts/layouts';
import type { Item } from '@/lib/layout/items';
import { applyChanges, rebase, type Change, type Items } from './changes';
import { EMPTY_HISTORY, record, redo, undo, type History, type Walk } from './history';
import type { PointMm } from '@/lib/layout/geometry';
import { snapNear, type Guide } from './snap-lines';
import { DEFAULT_SNAPPING, NO_SNAPPING, type Snapping } from './snapping';
import {
  acknowledged,
  decided,
  departing,
  merged,
  refusedAsStale,
  restored,
  syncedWith,
  type Exchange,
  type Sync,
} from './sync';
import { hasTask } from './task-edits';
import { carrying } from './tools/move';
import { selectTool } from './tools/select';
import { NOTHING, type Draft, type Press, type Reply, type Selection, type Tool, type View } from './tools/tool';

export interface SheetState {
  readonly items: Items;
  readonly sync: Sync;
  readonly history: History;
  readonly selection: Selection;
  readonly tool: Tool;
  readonly draft: Draft | null;
  /** Where the plumb hangs, floor frame; null: nowhere. */
  readonly plumb: { readonly xMm: number; readonly yMm: number } | null;
  readonly snapping: Snapping;
  /** What the gesture under way snapped to. */
  readonly guides: readonly Guide[];
  /** The newest thing to say aloud. A new object each time, so that the same words twice are said twice. */
  readonly said: { readonly words: string; readonly isRefusal?: boolean } | null;
}

export interface LoadedSheet {
  readonly layoutVersion: number;
  readonly items: readonly StoredItem[];
  /** Edits that an earlier visit could not save. */
  readonly edits?: readonly Operation[];
}

const NO_GUIDES: readonly Guide[] = [];
/** Something nearer than so many times a shaky click snaps. */
const SNAP_SLACKS = 2;

/**
 * A sheet being edited: the one mutable object of the editor, thin over pure functions. Views subscribe and read immutable
 * states; every way to change items goes through `commit`, the history or an exchange with the server.
 */
export class Sheet {
  private state: SheetState;
  private readonly listeners = new Set<() => void>();
  private planPoints: readonly PointMm[] = [];

  constructor(
    loaded: LoadedSheet,
    private readonly newId: () => string,
  ) {
    const start: Exchange = {
      sync: syncedWith(loaded.layoutVersion, loaded.items),
      items: new Map(loaded.items.map(({ item }) => [item.id, item])),
    };
    this.state = {
      ...restored(start, loaded.edits ?? []),
      history: EMPTY_HISTORY,
      selection: NOTHING,
      tool: selectTool(),
      draft: null,
      plumb: null,
      snapping: DEFAULT_SNAPPING,
      guides: NO_GUIDES,
      said: null,
    };
  }

  readonly getState = (): SheetState => this.state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  private set(change: Partial<SheetState>): void {
    const next = { ...this.state, ...change };
    this.state = { ...next, selection: stillThere(next.selection, next.items) };
    for (const listener of [...this.listeners]) listener();
  }

  // Gestures

  press(at: Press): void {
    this.give((view) => this.state.tool.press(at, view));
  }

  move(at: Press): void {
    this.give((view) => this.state.tool.move(at, view));
  }

  release(at: Press): void {
    // Put down is put down: what it snapped to is of no interest any more.
    this.take(this.state.tool.release(at, this.view([])), NO_GUIDES);
  }

  finish(): void {
    this.take(this.state.tool.finish(this.view([])), NO_GUIDES);
  }

  /** Takes away what the tool has in hand; false where it holds nothing that can go. */
  removeInHand(): boolean {
    const reply = this.state.tool.remove?.();
    if (reply) this.take(reply, NO_GUIDES);
    return reply !== undefined;
  }

  /** Takes back what is under way; at rest it lets the selection go. */
  cancel(): void {
    const { tool, draft } = this.state;
    if (tool.busy || draft) {
      this.set({ tool: tool.cancel(), draft: null, guides: NO_GUIDES, said: { words: 'Taken back' } });
    } else this.set({ selection: NOTHING, plumb: null });
  }

  /** The press in hand was taken away; the tool stays. */
  interrupt(): void {
    this.set({ tool: this.state.tool.interrupted(), draft: null, guides: NO_GUIDES });
  }

  use(tool: Tool): void {
    this.set({ tool, draft: null, guides: NO_GUIDES });
  }

  /** Picks up what is chosen: it follows the pointer until it is clicked down. */
  pickUp(): void {
    const { selection } = this.state;
    if (selection.itemIds.length > 0) this.use(carrying(selection, this.view([]), selectTool));
  }

  /** Points of the floor plan to snap to, floor frame. */
  setPlanPoints(points: readonly PointMm[]): void {
    this.planPoints = points;
  }

  private give(ask: (view: View) => Reply): void {
    const guides: Guide[] = [];
    const reply = ask(this.view(guides));
    this.take(reply, guides.length > 0 ? guides : NO_GUIDES);
  }

  /** The sheet as a tool sees it; what its snapping falls to is added to `guides`. */
  private view(guides: Guide[]): View {
    const { items, selection, snapping } = this.state;
    const { planPoints, newId } = this;
    return {
      items,
      selection,
      snapping,
      newId,
      snap: (wanted, { alt, slackMm }, moved) => {
        const reachMm = slackMm * SNAP_SLACKS;
        const used = alt ? NO_SNAPPING : snapping;
        const { guides: found, ...spot } = snapNear({ wanted, items, planPoints, snapping: used, reachMm, moved });
        guides.push(...found);
        return spot;
      },
    };
  }

  private take(reply: Reply, guides: readonly Guide[]): void {
    const { tool, draft, selection, step, plumb, say } = reply;
    // A press that changes nothing is not worth a new picture.
    const idle = tool === this.state.tool && draft === undefined && !selection && !step && !plumb && !say;
    if (idle && guides === this.state.guides) return;
    this.set({
      tool,
      guides,
      ...(draft !== undefined && { draft }),
      ...(step && this.afterStep(step.label, step.changes)),
      ...(selection && { selection }),
      ...(plumb && { plumb }),
      ...(say && { said: { words: say } }),
    });
  }

  // Edits

  /** Makes one step of the history. Fields that a colleague changed meanwhile and the step does not touch stay theirs. */
  commit(label: string, changes: readonly Change[], selection?: Selection): void {
    this.set({ draft: null, ...this.afterStep(label, changes), ...(selection && { selection }) });
  }

  /** Shows items as they would become while something beside the drawing is dragged; `commit` or `interrupt` ends it. */
  preview(items: readonly Item[]): void {
    this.set({ draft: { items } });
  }

  private afterStep(label: string, changes: readonly Change[]): Partial<SheetState> {
    const { items, history } = this.state;
    const real = rebase(items, changes);
    if (real.length === 0) return {};
    return { items: applyChanges(items, real), history: record(history, label, real), said: { words: label } };
  }

  undo(): void {
    this.walk(undo(this.state.history, this.state.items), 'Undone');
  }

  redo(): void {
    this.walk(redo(this.state.history, this.state.items), 'Redone');
  }

  private walk(walk: Walk | null, word: string): void {
    if (!walk) return;
    const { history, changes, label } = walk;
    const tool = this.state.tool.busy ? this.state.tool.cancel() : this.state.tool;
    const items = applyChanges(this.state.items, changes);
    this.set({ items, history, tool, draft: null, guides: NO_GUIDES, said: { words: `${word}: ${label}` } });
  }

  select(selection: Selection): void {
    this.set({ selection });
  }

  hangPlumb(plumb: SheetState['plumb']): void {
    this.set({ plumb });
  }

  setSnapping(snapping: Snapping): void {
    this.set({ snapping });
  }

  say(words: string): void {
    this.set({ said: { words } });
  }

  /** Says why something was not done, where eyes find it as well. */
  refuse(words: string): void {
    this.set({ said: { words, isRefusal: true } });
  }

  // Exchange with the server

  /** The batch to send now, marked as in flight; null with nothing to send. */
  depart(batchId: string): OperationBatch | null {
    const sync = departing(this.state.sync, this.state.items, batchId);
    if (!sync) return null;
    this.set({ sync });
    return sync.inFlight;
  }

  acknowledge(result: OperationResult): void {
    this.set({ sync: acknowledged(this.state.sync, result) });
  }

  /** Answers false where the server's word brings nothing new, so that sending again would only go round in a circle. */
  meetStale(conflicts: readonly { itemId: string; current: StoredItem | null }[]): boolean {
    const before = this.state.sync;
    const { sync, items } = refusedAsStale(this.state, conflicts);
    this.set({ sync, items });
    return sync.stored !== before.stored || sync.conflicts !== before.conflicts;
  }

  /** The batch in flight was turned down as a whole; its edits stay on the sheet as differences. */
  drop(): void {
    const { sync } = this.state;
    this.set({ sync: { ...sync, inFlight: null, exchanges: sync.exchanges + 1 } });
  }

  merge(changes: LayoutChanges): void {
    const before = this.state;
    const { sync, items } = merged(before, changes);
    if (sync !== before.sync || items !== before.items) this.set({ sync, items });
  }

  decide(itemId: string, choice: 'mine' | 'theirs'): void {
    this.set(decided(this.state, itemId, choice));
  }
}

/** A colleague may have removed what was chosen. */
function stillThere(selection: Selection, items: Items): Selection {
  if (selection.itemIds.every((id) => items.has(id))) {
    if (!selection.taskPointId) return selection;
    const [item] = selection.itemIds.map((id) => items.get(id));
    const there = item?.kind === 'fixture' && hasTask(item, selection.taskPointId);
    return there ? selection : { ...selection, taskPointId: null };
  }
  return { itemIds: selection.itemIds.filter((id) => items.has(id)), taskPointId: null };
}

/** The items as drawn: with the gesture under way laid over them. */
export function shownItems({ items, draft }: Pick<SheetState, 'items' | 'draft'>): Items {
  if (!draft || draft.items.length === 0) return items;
  return applyChanges(
    items,
    draft.items.map((item: Item) => ({ itemId: item.id, before: null, after: item })),
  );
}
