import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { changeOf, verdictOf, type ComparedFigure } from '@/lib/layout/compared-figures';
import { show } from '@/tests/components/show';
import { barsOf, FiguresTable } from './figures-table';

const figure = (part: Partial<ComparedFigure>): ComparedFigure => ({
  label: 'Floor reached',
  unit: 'm²',
  decimals: 1,
  left: 9.6,
  right: 9.9,
  better: 'more',
  ...part,
});

describe('the table of numbers', () => {
  it('writes both numbers, the change with its sign, and says whether it helps', () => {
    show(
      <FiguresTable
        leftName="B"
        rightName="C"
        figures={[
          figure({ label: 'Task points met', unit: '', decimals: 0, left: 8, right: 9, leftOf: 9, rightOf: 9 }),
          figure({ label: 'Floor reached', left: 9.9, right: 9.6 }),
          figure({ label: 'Guarded floor', left: 23.8, right: 25, better: 'neither' }),
          figure({ label: 'Floor at or above 0.10', left: null, right: 3 }),
        ]}
      />,
    );
    const row = (name: RegExp) => within(screen.getByRole('row', { name }));
    expect(row(/Task points met/).getByText('8 of 9')).toBeVisible();
    expect(row(/Task points met/).getByText(/^\+1/)).toHaveTextContent('+1 better');
    expect(row(/Floor reached/).getByText(/^−0\.3/)).toHaveTextContent('−0.3 worse');
    expect(row(/Guarded floor/).getByText(/^\+1\.2/)).not.toHaveTextContent(/better|worse/);
    expect(row(/Floor at or above/).getAllByText('–')).toHaveLength(2);
    expect(screen.getByRole('columnheader', { name: 'C − B' })).toBeVisible();
  });
});

describe('a change', () => {
  it('adds up as it is written', () => {
    expect(changeOf(figure({ left: 10.56, right: 10.34 }))).toBe(-0.3);
    expect(changeOf(figure({ left: 1.04, right: 0.98 }))).toBe(0);
  });

  it('is judged by the direction of better', () => {
    expect(verdictOf(figure({ better: 'less' }))).toBe('worse');
    expect(verdictOf(figure({ left: 1.04, right: 0.98 }))).toBe('none');
    expect(verdictOf(figure({ right: null }))).toBe('none');
  });

  it('is drawn against the count, or against the larger number; a negative one has no bar', () => {
    expect(barsOf(figure({ left: 8, right: 9, leftOf: 9, rightOf: 10 }))).toEqual({ left: 0.8, right: 0.9 });
    expect(barsOf(figure({ left: -0.09, right: 0.31 }))).toEqual({ left: 0, right: 1 });
    expect(barsOf(figure({ left: 0, right: 0 }))).toEqual({ left: 0, right: 0 });
  });
});
