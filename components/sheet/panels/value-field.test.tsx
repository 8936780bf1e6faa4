import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { chooseUnit } from '@/lib/client/use-units';
import { ValueField } from './value-field';

/** A field that keeps its value as the sheet does, and takes nothing above 5000. */
function Kept({ onTaken }: { onTaken: (value: number) => void }) {
  const [value, setValue] = useState(1200);
  return (
    <ValueField
      label="x"
      kind="length"
      value={value}
      step={50}
      onCommit={(next) => {
        if (next > 5000) return 'That is too far. Write at most 5000.';
        onTaken(next);
        setValue(next);
        return null;
      }}
    />
  );
}

function open() {
  const onTaken = vi.fn();
  render(<Kept onTaken={onTaken} />);
  return { onTaken, user: userEvent.setup({ delay: null }), field: screen.getByLabelText<HTMLInputElement>('x') };
}

describe('a typed value', () => {
  it('is taken on Enter, with units and sums', async () => {
    const { user, field, onTaken } = open();
    await user.clear(field);
    await user.type(field, '1.2 m + 350{Enter}');
    expect(onTaken).toHaveBeenCalledExactlyOnceWith(1550);
    expect(field.value).toBe('1550');
  });

  it('is taken on leaving the field', async () => {
    const { user, field, onTaken } = open();
    await user.clear(field);
    await user.type(field, '900');
    await user.tab();
    expect(onTaken).toHaveBeenCalledExactlyOnceWith(900);
  });

  it.each([
    ['abc', /no length/],
    ['', /Write a number/],
    ['9 kg', /no length/],
    ['7000', /too far/],
  ])('"%s" is refused with the reason, and the value before stays', async (text, reason) => {
    const { user, field, onTaken } = open();
    await user.clear(field);
    if (text) await user.type(field, text);
    await user.keyboard('{Enter}');
    expect(screen.getByRole('alert')).toHaveTextContent(reason);
    expect(field).toBeInvalid();
    expect(field.value).toBe(text);
    await user.tab();
    expect(field.value).toBe('1200');
    expect(screen.getByRole('alert')).toHaveTextContent(reason);
    expect(onTaken).not.toHaveBeenCalled();
  });

  it('goes back with Escape', async () => {
    const { user, field, onTaken } = open();
    await user.clear(field);
    await user.type(field, '77{Escape}');
    expect(field.value).toBe('1200');
    expect(onTaken).not.toHaveBeenCalled();
  });

  it('steps with the arrow keys, ten times as far with Shift', async () => {
    const { user, field } = open();
    field.focus();
    await user.keyboard('{ArrowUp}');
    expect(field.value).toBe('1250');
    await user.keyboard('{Shift>}{ArrowDown}{/Shift}');
    expect(field.value).toBe('750');
  });
});

describe('a length read in inches', () => {
  beforeEach(() => chooseUnit('in'));
  afterEach(() => chooseUnit('mm'));

  it('is shown in inches and left exactly as it is while nothing is typed', async () => {
    const { user, field, onTaken } = open();
    // 1200 / 25.4 = 47.2440…
    expect(field.value).toBe('47.2441');
    await user.click(field);
    await user.keyboard('{Enter}');
    await user.clear(field);
    await user.type(field, '47.2441{Enter}');
    await user.tab();
    expect(onTaken).not.toHaveBeenCalled();
  });

  it('takes a bare number as inches, and other units in a sum', async () => {
    const { user, field, onTaken } = open();
    await user.clear(field);
    await user.type(field, '10 + 100 mm{Enter}');
    expect(onTaken).toHaveBeenCalledExactlyOnceWith(354);
  });
});
