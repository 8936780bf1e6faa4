'use client';

import { useMemo } from 'react';
import { placeInView, placeTaskPointInView } from '@/lib/editor/place-in-view';
import { dimensionTool } from '@/lib/editor/tools/dimension';
import { lineTool } from '@/lib/editor/tools/line';
import { blockTool, noteTool, panTool, plumbTool, robotTool, taskPointTool } from '@/lib/editor/tools/place';
import { sectionTool } from '@/lib/editor/tools/section';
import { selectTool } from '@/lib/editor/tools/select';
import type { Tool, ToolName } from '@/lib/editor/tools/tool';
import { useBoard } from './board-context';

const newId = () => crypto.randomUUID();

/** The two ways to place something: a tool for the pointer, or at once in the middle of the view. */
export function usePlace() {
  const { sheet, view, libraryArms } = useBoard();
  return useMemo(() => {
    const anArm = (armId?: string) => armId ?? libraryArms[0]?.id;

    function toolNamed(name: ToolName, armId?: string): Tool | null {
      switch (name) {
        case 'robot': {
          const arm = anArm(armId);
          return arm ? robotTool(arm) : null;
        }
        case 'fixture':
        case 'obstacle':
        case 'column':
        case 'zone':
          return blockTool(name);
        case 'guardLine':
        case 'walkway':
        case 'conveyor':
        case 'protectiveDevice':
          return lineTool(name);
        case 'taskPoint':
          return taskPointTool();
        case 'dimension':
          return dimensionTool();
        case 'sectionLine':
          return sectionTool();
        case 'note':
          return noteTool();
        case 'plumb':
          return plumbTool();
        case 'pan':
          return panTool();
        case 'select':
        case 'carry':
        // A fixture of the library is taken in hand with its content, not by name.
        case 'ownFixture':
        case 'outline':
          return selectTool();
      }
    }

    return {
      /** Takes a tool in hand. A robot needs an arm: the one named, else the first of the library. */
      take(name: ToolName, armId?: string) {
        const tool = toolNamed(name, armId);
        if (!tool) return sheet.refuse('The library has no arm yet. Add one on the page Arms.');
        sheet.use(tool);
      },
      /** Does at once what the tool would do in the middle of the view. */
      placeAtOnce(name: ToolName, armId?: string) {
        const { items, selection, snapping } = sheet.getState();
        const middle = view.middle();
        if (name === 'select' || name === 'carry' || name === 'outline' || name === 'ownFixture' || name === 'pan')
          return sheet.use(name === 'pan' ? panTool() : selectTool());
        if (name === 'plumb') return sheet.hangPlumb({ xMm: Math.round(middle.xMm), yMm: Math.round(middle.yMm) });
        if (name === 'taskPoint') {
          const placed = placeTaskPointInView(items, selection, middle, newId);
          if (!placed) return sheet.refuse('A task point belongs to a fixture. Place a fixture first.');
          return sheet.commit(placed.label, placed.changes, placed.selection);
        }
        const arm = anArm(armId);
        if (name === 'robot' && !arm) return sheet.refuse('The library has no arm yet. Add one on the page Arms.');
        const placed = placeInView(items, { kind: name, armId: arm, middle, snapping, newId });
        sheet.commit(placed.label, placed.changes, placed.selection);
      },
    };
  }, [sheet, view, libraryArms]);
}
