import { floorToItem } from '@/lib/layout/geometry';
import type { LibraryFixture } from '@/lib/contracts/library-fixtures';
import type { Item } from '@/lib/layout/items';
import { fixtureAt } from '../footprint';
import { put } from '../changes';
import { newBlock, newColumn, newNote, newRobot, newTaskPoint, newZone, type NewItem } from '../make-items';
import { copyOfSaved } from '../saved-fixtures';
import { tidy } from '../snapping';

import { selectTool } from './select';
import { chosen, state, type Press, type Reply, type Tool, type View } from './tool';

/** Nothing drawn smaller than this is meant as a size. */
const LEAST_SIZE_MM = 50;

function placedReply(item: Item, { items }: View): Reply {
  const label = `Place ${item.name}`;
  return { tool: selectTool(), draft: null, selection: chosen(item.id), step: { label, changes: [put(items, item)] } };
}

/** A robot stands where it is clicked; until then a ghost of it follows the pointer. */
export function robotTool(armId: string): Tool {
  const at = (press: Press, view: View, id: string) => newRobot(view.items, { id, ...view.snap(press, press) }, armId);
  const self: Tool = state('robot', 'Click where the base stands.', {
    move: (press, view) => ({ tool: self, draft: { items: [at(press, view, GHOST)] } }),
    press: () => ({ tool: self }),
    release: (press, view) => placedReply(at(press, view, view.newId()), view),
    cancel: selectTool,
    busy: true,
  });
  return self;
}

/** The id of what follows the pointer before it is placed; it never leaves the draft. */
const GHOST = '00000000-0000-4000-8000-000000000000';

type BlockKind = 'fixture' | 'obstacle' | 'column' | 'zone';
type SizeMm = { readonly width: number; readonly depth: number };

const BLOCK_WORDS: Record<BlockKind, string> = {
  fixture: 'a fixture',
  obstacle: 'an obstacle',
  column: 'a column',
  zone: 'a zone',
};

function block(items: View['items'], kind: BlockKind, at: NewItem, sizeMm?: SizeMm): Item {
  if (kind === 'column') return newColumn(items, at, sizeMm);
  return kind === 'zone' ? newZone(items, at, sizeMm) : newBlock(items, kind, at, sizeMm);
}

/** What has an outline: a click places the usual size, a drag draws one. */
export function blockTool(kind: BlockKind): Tool {
  const self: Tool = state(kind, `Click to place ${BLOCK_WORDS[kind]}, or drag to draw its size.`, {
    move: (press, view) => {
      const spot = view.snap(press, press);
      return { tool: self, draft: { items: [block(view.items, kind, { id: GHOST, ...spot })] } };
    },
    press: (press) => ({ tool: drawingBlock(kind, press) }),
    cancel: selectTool,
    busy: true,
  });
  return self;
}

function drawingBlock(kind: BlockKind, start: Press): Tool {
  const at = (press: Press, view: View, id: string): Item => {
    const from = view.snap(start, press);
    const to = view.snap(press, press);
    const size = { width: tidy(Math.abs(to.xMm - from.xMm)), depth: tidy(Math.abs(to.yMm - from.yMm)) };
    if (size.width < LEAST_SIZE_MM || size.depth < LEAST_SIZE_MM) return block(view.items, kind, { id, ...from });
    const middle = { xMm: tidy((from.xMm + to.xMm) / 2), yMm: tidy((from.yMm + to.yMm) / 2) };
    return block(view.items, kind, { id, ...middle }, size);
  };
  const self: Tool = state(kind, `Release to place ${BLOCK_WORDS[kind]}.`, {
    busy: true,
    move: (press, view) => ({ tool: self, draft: { items: [at(press, view, GHOST)] } }),
    release: (press, view) => placedReply(at(press, view, view.newId()), view),
    cancel: selectTool,
    interrupted: () => blockTool(kind),
  });
  return self;
}

/** A copy of a fixture of the library, with its task points. */
export function savedFixtureTool(saved: LibraryFixture): Tool {
  const at = (press: Press, view: View, id: string) =>
    copyOfSaved(view.items, saved, { id, ...view.snap(press, press) }, view.newId);
  const self: Tool = state('ownFixture', `Click to place ${saved.name}.`, {
    busy: true,
    move: (press, view) => ({ tool: self, draft: { items: [at(press, view, GHOST)] } }),
    release: (press, view) => placedReply(at(press, view, view.newId()), view),
    cancel: selectTool,
  });
  return self;
}

/** A note hangs where it is clicked; its words are typed beside the sheet. */
export function noteTool(): Tool {
  const at = (press: Press, view: View, id: string) => newNote(view.items, { id, ...view.snap(press, press) });
  const self: Tool = state('note', 'Click where the note begins, then type its words.', {
    busy: true,
    move: (press, view) => ({ tool: self, draft: { items: [at(press, view, GHOST)] } }),
    release: (press, view) => placedReply(at(press, view, view.newId()), view),
    cancel: selectTool,
  });
  return self;
}

/** How far off a fixture's place a task point may still be put on it, mm. */
const NEAR_FIXTURE_MM = 1500;

/** A task point goes onto the fixture under the click; the tool stays, since there are often several. */
export function taskPointTool(): Tool {
  const self: Tool = state('taskPoint', 'Click on a fixture to add a task point. Escape ends.', {
    busy: true,
    release: (press, view) => {
      const spot = view.snap(press, press);
      const fixture = fixtureAt(view.items, [press.xMm, press.yMm], NEAR_FIXTURE_MM);
      if (!fixture)
        return { tool: self, say: 'A task point belongs to a fixture. Place a fixture first, then click on it.' };
      const [xMm, yMm] = floorToItem(fixture, [spot.xMm, spot.yMm]).map(tidy);
      const point = newTaskPoint(fixture, view.newId(), [xMm, yMm]);
      const after = { ...fixture, taskPoints: [...fixture.taskPoints, point] };
      return {
        tool: self,
        selection: { itemIds: [fixture.id], taskPointId: point.id },
        step: { label: `Place ${point.name}`, changes: [put(view.items, after)] },
      };
    },
    cancel: selectTool,
  });
  return self;
}

/** Reads a spot: a click drops the plumb, a drag draws it along. It changes nothing. */
export function plumbTool(): Tool {
  const at = ({ xMm, yMm }: Press) => ({ xMm: Math.round(xMm), yMm: Math.round(yMm) });
  const held: Tool = state('plumb', 'Drag to read along the way.', {
    busy: true,
    move: (press) => ({ tool: held, plumb: at(press) }),
    release: (press) => ({ tool: plumbTool(), plumb: at(press) }),
    cancel: selectTool,
    interrupted: plumbTool,
  });
  return state('plumb', 'Click a spot to read everything there. Escape ends.', {
    busy: true,
    press: (press) => ({ tool: held, plumb: at(press) }),
    cancel: selectTool,
  });
}

/** The canvas itself moves the view with this tool; nothing on the sheet answers. */
export function panTool(): Tool {
  return state('pan', 'Drag to move the view.', { busy: true, cancel: selectTool });
}
