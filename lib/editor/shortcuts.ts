import type { ToolName } from './tools/tool';

/** What a key asks of the sheet. */
export type Command =
  | {
      readonly name:
        | 'undo'
        | 'redo'
        | 'delete'
        | 'duplicate'
        | 'selectAll'
        | 'group'
        | 'ungroup'
        | 'pickUp'
        | 'lock'
        | 'hide'
        | 'cancel'
        | 'finish'
        | 'fit'
        | 'help';
    }
  | { readonly name: 'tool'; readonly tool: ToolName }
  | { readonly name: 'nudge'; readonly xSteps: number; readonly ySteps: number }
  | { readonly name: 'turn'; readonly steps: number };

export interface Keystroke {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
}

const TOOL_KEYS: Record<string, ToolName> = {
  v: 'select',
  h: 'pan',
  r: 'robot',
  f: 'fixture',
  o: 'obstacle',
  k: 'column',
  g: 'guardLine',
  w: 'walkway',
  c: 'conveyor',
  n: 'note',
  z: 'zone',
  l: 'protectiveDevice',
  t: 'taskPoint',
  d: 'dimension',
  s: 'sectionLine',
  p: 'plumb',
};

const ARROWS: Record<string, readonly [number, number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};

/** The command of a keystroke on the sheet, or null. Arrows go one step, with Shift ten. */
export function commandOf({ key, ctrlKey, metaKey, shiftKey, altKey }: Keystroke): Command | null {
  const lower = key.toLowerCase();
  if (ctrlKey || metaKey) {
    if (altKey) return null;
    if (lower === 'z') return { name: shiftKey ? 'redo' : 'undo' };
    if (lower === 'y') return { name: 'redo' };
    if (lower === 'd') return { name: 'duplicate' };
    if (lower === 'a') return { name: 'selectAll' };
    if (lower === 'g') return { name: shiftKey ? 'ungroup' : 'group' };
    return null;
  }
  const arrow = ARROWS[key];
  if (arrow) {
    const size = shiftKey ? 10 : 1;
    return { name: 'nudge', xSteps: arrow[0] * size, ySteps: arrow[1] * size };
  }
  if (altKey) return null;
  if (key === 'Escape') return { name: 'cancel' };
  if (key === 'Enter') return { name: 'finish' };
  if (key === 'Delete' || key === 'Backspace') return { name: 'delete' };
  if (key === '[') return { name: 'turn', steps: 1 };
  if (key === ']') return { name: 'turn', steps: -1 };
  if (key === '?') return { name: 'help' };
  if (key === '0') return { name: 'fit' };
  if (lower === 'm' && !shiftKey) return { name: 'pickUp' };
  if (lower === 'b') return { name: shiftKey ? 'hide' : 'lock' };
  const tool = shiftKey ? undefined : TOOL_KEYS[lower];
  return tool ? { name: 'tool', tool } : null;
}

export interface ShortcutGroup {
  readonly title: string;
  readonly entries: readonly { readonly keys: readonly string[]; readonly words: string }[];
}

/** The page of shortcuts. */
export const SHORTCUTS: readonly ShortcutGroup[] = [
  {
    title: 'On the sheet',
    entries: [
      { keys: ['Click'], words: 'Choose; with Shift several; again: one of a group' },
      { keys: ['M'], words: 'Pick up what is chosen; a click puts it down, no drag needed' },
      { keys: ['Arrows'], words: 'Move by one step; with Shift by ten' },
      { keys: ['[', ']'], words: 'Turn by one step' },
      { keys: ['Alt'], words: 'Held: suspends snapping' },
      { keys: ['Shift'], words: 'Held while dragging: stays level or upright' },
      { keys: ['Escape'], words: 'Take back what is under way; then let go' },
      { keys: ['Enter'], words: 'End a guard line or walkway' },
      { keys: ['Delete'], words: 'Delete what is chosen' },
    ],
  },
  {
    title: 'Edit',
    entries: [
      { keys: ['Ctrl', 'Z'], words: 'Undo' },
      { keys: ['Ctrl', 'Shift', 'Z'], words: 'Redo' },
      { keys: ['Ctrl', 'D'], words: 'Duplicate' },
      { keys: ['Ctrl', 'C'], words: 'Copy; Ctrl X cuts' },
      { keys: ['Ctrl', 'V'], words: 'Paste, also on another sheet' },
      { keys: ['Ctrl', 'A'], words: 'Choose everything' },
      { keys: ['Ctrl', 'G'], words: 'Make one group; with Shift take it apart' },
      { keys: ['B'], words: 'Bolt down: lock or unlock' },
      { keys: ['Shift', 'B'], words: 'Hide or show' },
    ],
  },
  {
    title: 'Tools',
    entries: [
      { keys: ['V'], words: 'Choose and move' },
      { keys: ['R'], words: 'Robot' },
      { keys: ['F'], words: 'Fixture' },
      { keys: ['O'], words: 'Obstacle' },
      { keys: ['K'], words: 'Column' },
      { keys: ['G'], words: 'Guard line' },
      { keys: ['W'], words: 'Walkway' },
      { keys: ['C'], words: 'Conveyor' },
      { keys: ['N'], words: 'Note' },
      { keys: ['T'], words: 'Task point' },
      { keys: ['D'], words: 'Dimension' },
      { keys: ['S'], words: 'Section line' },
      { keys: ['P'], words: 'Plumb' },
    ],
  },
  {
    title: 'View',
    entries: [
      { keys: ['Wheel'], words: 'Zoom; + and − on the keyboard' },
      { keys: ['Space'], words: 'Held while dragging: moves the view; so does the middle button' },
      { keys: ['H'], words: 'Move the view' },
      { keys: ['0'], words: 'Show the whole sheet' },
      { keys: ['?'], words: 'This list' },
    ],
  },
];
