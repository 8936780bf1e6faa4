import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { MillimetresProvider } from './millimetres-context';
import { NumberInput } from './number-input';

function Held({ start, onCommit, max }: { start: number | null; onCommit?: (value: number) => void; max?: number }) {
  const [value, setValue] = useState(start);
  return (
    <NumberInput
      aria-label="x"
      value={value}
      max={max}
      onCommit={(next) => {
        setValue(next);
        onCommit?.(next);
      }}
    />
  );
}

describe('NumberInput', () => {
  it('hands over the finished number once, whatever decimal mark is typed', async () => {
    const onCommit = vi.fn();
    const user = userEvent.setup();
    render(<Held start={10} onCommit={onCommit} />);
    const field = screen.getByLabelText('x');
    await user.clear(field);
    await user.type(field, '1 234,5');
    expect(onCommit).not.toHaveBeenCalled();
    await user.tab();
    expect(onCommit.mock.calls).toEqual([[1234.5]]);
    expect(field).toHaveValue('1234.5');
  });

  it('goes back to the last number when what was typed is none', async () => {
    const onCommit = vi.fn();
    const user = userEvent.setup();
    render(<Held start={10} onCommit={onCommit} />);
    const field = screen.getByLabelText('x');
    await user.clear(field);
    await user.type(field, 'ten');
    await user.tab();
    expect(field).toHaveValue('10');
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('drops the draft on Escape and stays within its limits', async () => {
    const onCommit = vi.fn();
    const user = userEvent.setup();
    render(<Held start={10} onCommit={onCommit} max={50} />);
    const field = screen.getByLabelText('x');
    await user.type(field, '7{Escape}');
    expect(field).toHaveValue('10');
    await user.type(field, '7{Enter}');
    expect(onCommit.mock.calls).toEqual([[50]]);
  });
});

describe('NumberInput of a length', () => {
  // An inch is exactly 25.4 mm.
  const inches = {
    unit: 'in',
    mmPerUnit: 25.4,
    moreDecimals: 2,
    read: (text: string) => (Number.isFinite(Number(text)) ? Number(text) * 25.4 : null),
    step: () => 25.4,
  };

  it('is shown and read in the reader’s unit, and left exactly as it is while nothing is typed', async () => {
    const onCommit = vi.fn();
    const user = userEvent.setup();
    render(
      <MillimetresProvider value={inches}>
        <NumberInput aria-label="x" unit="mm" decimals={1} value={1200.123} onCommit={onCommit} />
      </MillimetresProvider>,
    );
    const field = screen.getByLabelText('x');
    // 1200.123 / 25.4 = 47.2489…
    expect(field).toHaveValue('47.249');
    await user.click(field);
    await user.keyboard('{Enter}');
    await user.clear(field);
    await user.type(field, '47.249');
    await user.tab();
    expect(onCommit).not.toHaveBeenCalled();
    await user.clear(field);
    await user.type(field, '10{Enter}');
    expect(onCommit.mock.calls).toEqual([[254]]);
  });
});
