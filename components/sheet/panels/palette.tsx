'use client';

import { OwnFixturesRow } from '@/components/sheet/fixture-library/own-fixtures-row';
import { Menu, MenuHeading, MenuItem } from '@/components/ui/menu';
import { classNames } from '@/components/ui/class-names';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useLastInput } from '@/components/sheet/editor/use-last-input';
import { usePlace } from '@/components/sheet/editor/use-place';
import type { ToolName } from '@/lib/editor/tools/tool';
import { Glyph } from './palette-glyphs';

const PLACED: readonly { tool: ToolName; label: string; shortcut: string }[] = [
  { tool: 'fixture', label: 'Fixture', shortcut: 'F' },
  { tool: 'conveyor', label: 'Conveyor', shortcut: 'C' },
  { tool: 'obstacle', label: 'Obstacle', shortcut: 'O' },
  { tool: 'column', label: 'Column', shortcut: 'K' },
  { tool: 'guardLine', label: 'Guard line', shortcut: 'G' },
  { tool: 'walkway', label: 'Walkway', shortcut: 'W' },
  { tool: 'zone', label: 'Zone', shortcut: 'Z' },
  { tool: 'protectiveDevice', label: 'Protective device', shortcut: 'L' },
  { tool: 'taskPoint', label: 'Task point', shortcut: 'T' },
  { tool: 'note', label: 'Note', shortcut: 'N' },
];
const MEASURES: readonly { tool: ToolName; label: string; shortcut: string }[] = [
  { tool: 'dimension', label: 'Dimension', shortcut: 'D' },
  { tool: 'sectionLine', label: 'Section line', shortcut: 'S' },
  { tool: 'plumb', label: 'Plumb', shortcut: 'P' },
];

const ROW =
  'flex min-h-[1.85rem] w-full items-center gap-3 pr-3.5 pl-[11px] text-left hover:bg-petrol-wash focus-visible:-outline-offset-2 aria-pressed:bg-petrol-wash aria-pressed:border-l-petrol border-l-[3px] border-transparent pointer-coarse:min-h-11';

/** Things to place and to measure with. A click takes the tool in hand; by keyboard the thing is placed at once. */
export function Palette() {
  return (
    <>
      <h2 className="px-3.5 pt-3.5 pb-1 text-[0.8125rem] font-medium text-ink-soft">Place on the floor</h2>
      <RobotRow />
      {PLACED.map((entry) => (
        <ToolRow key={entry.tool} {...entry} />
      ))}
      <OwnFixturesRow className={classNames(ROW, 'py-1')} />
      <h2 className="px-3.5 pt-4 pb-1 text-[0.8125rem] font-medium text-ink-soft">Measure</h2>
      {MEASURES.map((entry) => (
        <ToolRow key={entry.tool} {...entry} />
      ))}
    </>
  );
}

function ToolRow({ tool, label, shortcut }: (typeof PLACED)[number]) {
  const inHand = useBoardSheet((state) => state.tool.name);
  const lastInput = useLastInput();
  const { take, placeAtOnce } = usePlace();
  const activate = () => {
    if (lastInput() === 'keyboard') placeAtOnce(tool);
    else take(inHand === tool ? 'select' : tool);
  };
  return (
    <button
      type="button"
      aria-pressed={inHand === tool}
      aria-keyshortcuts={shortcut}
      data-tool={tool}
      onClick={activate}
      className={classNames(ROW, 'group')}
    >
      <Glyph tool={tool} />
      <span className="flex-1">{label}</span>
      <kbd
        className="text-xs text-ink-soft opacity-0 group-hover:opacity-100 group-focus-visible:opacity-100"
        aria-hidden
      >
        {shortcut}
      </kbd>
    </button>
  );
}

function RobotRow() {
  const { libraryArms, isLibraryThere } = useBoard();
  const inHand = useBoardSheet((state) => state.tool.name);
  const lastInput = useLastInput();
  const { take, placeAtOnce } = usePlace();
  const count = libraryArms.length;
  return (
    <Menu
      align="start"
      trigger={
        <button type="button" aria-pressed={inHand === 'robot'} data-tool="robot" className={classNames(ROW, 'py-1')}>
          <Glyph tool="robot" />
          <span>
            Robot
            <span className="block text-[0.8125rem] leading-4 text-ink-soft">
              {isLibraryThere ? `${count} in the library` : 'opening the library'}
            </span>
          </span>
        </button>
      }
    >
      <MenuHeading>Which arm?</MenuHeading>
      {libraryArms.map(({ id, name, reachMm }) => (
        <MenuItem key={id} onSelect={() => (lastInput() === 'keyboard' ? placeAtOnce('robot', id) : take('robot', id))}>
          {name}
          <span className="block text-[0.8125rem] leading-4 text-ink-soft">
            reach <span className="font-mono">{Math.round(reachMm)}</span> mm
          </span>
        </MenuItem>
      ))}
      {count === 0 && (
        <MenuHeading>{isLibraryThere ? 'None yet. Add one on the page Arms.' : 'Opening the library'}</MenuHeading>
      )}
    </Menu>
  );
}
