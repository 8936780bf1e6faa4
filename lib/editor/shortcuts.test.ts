import { describe, expect, it } from 'vitest';
import { commandOf, type Keystroke } from './shortcuts';

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
