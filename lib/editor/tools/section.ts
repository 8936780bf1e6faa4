import { distanceMm, type PointMm } from '@/lib/layout/geometry';
import { put } from '../changes';
import { newSectionLine } from '../make-items';
import { selectTool } from './select';
import { chosen, state, type Press, type Tool, type View } from './tool';

const DRAFT_ID = '00000000-0000-4000-8000-000000000003';

/** A section line from one end to the other. */
export function sectionTool(): Tool {
  return state('sectionLine', 'Click where the section begins.', {
    busy: true,
    release: (press, view) => {
      const { xMm, yMm } = view.snap(press, press);
      return { tool: cutting([xMm, yMm]) };
    },
    cancel: selectTool,
  });
}

function cutting(from: PointMm): Tool {
  const toward = (press: Press, view: View): PointMm => {
    const { xMm, yMm } = view.snap(press, press);
    if (!press.shift) return [xMm, yMm];
    return Math.abs(xMm - from[0]) >= Math.abs(yMm - from[1]) ? [xMm, from[1]] : [from[0], yMm];
  };
  const self: Tool = state('sectionLine', 'Click where the section ends. Shift keeps it level or upright.', {
    busy: true,
    move: (press, view) => {
      const to = toward(press, view);
      const items = distanceMm(from, to) > 0 ? [newSectionLine(view.items, DRAFT_ID, from, to)] : [];
      return { tool: self, draft: { items } };
    },
    release: (press, view) => {
      const to = toward(press, view);
      if (distanceMm(from, to) === 0) return { tool: self };
      const item = newSectionLine(view.items, view.newId(), from, to);
      const step = { label: `Place ${item.name}`, changes: [put(view.items, item)] };
      return { tool: selectTool(), draft: null, selection: chosen(item.id), step };
    },
    cancel: sectionTool,
  });
  return self;
}
