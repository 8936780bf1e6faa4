import { describe, expect, it } from 'vitest';
import { commandOf, SHORTCUTS, type Keystroke } from './shortcuts';

const stroke = (key: string, held: Partial<Keystroke> = {}): Keystroke => ({
  key,
  ctrlKey: false,
  metaKey: false,
  shiftKey: false,
  altKey: false,
  ...held,
});

describe('keys on the sheet', () => {
  it.each([
    [stroke('z', { ctrlKey: true }), { name: 'undo' }],
    [stroke('Z', { metaKey: true, shiftKey: true }), { name: 'redo' }],
    [stroke('ArrowUp'), { name: 'nudge', xSteps: 0, ySteps: 1 }],
    [stroke('ArrowLeft', { shiftKey: true }), { name: 'nudge', xSteps: -10, ySteps: 0 }],
    [stroke('Backspace'), { name: 'delete' }],
    [stroke('G', { ctrlKey: true, shiftKey: true }), { name: 'ungroup' }],
    [stroke('m'), { name: 'pickUp' }],
    [stroke('b'), { name: 'lock' }],
    [stroke('B', { shiftKey: true }), { name: 'hide' }],
    [stroke('l'), { name: 'tool', tool: 'protectiveDevice' }],
    [stroke('r'), { name: 'tool', tool: 'robot' }],
    [stroke('?', { shiftKey: true }), { name: 'help' }],
  ])('%j', (keystroke, command) => expect(commandOf(keystroke)).toEqual(command));

  it.each([
    stroke('q'),
    stroke('r', { ctrlKey: true }),
    stroke('R', { shiftKey: true }),
    stroke('z', { altKey: true }),
  ])('leaves %j to the browser', (keystroke) => expect(commandOf(keystroke)).toBeNull());
});

it('names every key once on the page of shortcuts', () => {
  const named = SHORTCUTS.flatMap(({ entries }) => entries.map(({ keys }) => keys.join(' ')));
  expect(new Set(named).size).toBe(named.length);
});
