'use client';

import { useMemo } from 'react';
import { useBoardSheet } from '@/components/sheet/editor/board-context';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { inOrder } from '@/lib/editor/order';

const BEST = 'best';

interface DoneByProps {
  readonly robotId: string | null;
  readonly disabled?: boolean;
  readonly onChange: (robotId: string | null) => void;
}

/** Which robot shall do a task: one by hand, or the one that does best. */
export function DoneBy({ robotId, disabled, onChange }: DoneByProps) {
  const items = useBoardSheet((state) => state.items);
  const robots = useMemo(() => inOrder(items).filter(({ kind }) => kind === 'robot'), [items]);
  const isGone = robotId !== null && !robots.some(({ id }) => id === robotId);
  return (
    <Field label="Done by" inline className="mt-1 grid-cols-[4rem_minmax(0,1fr)]!">
      <Select
        className="min-h-7 text-sm"
        value={robotId ?? BEST}
        disabled={disabled}
        onValueChange={(value) => onChange(value === BEST ? null : value)}
        options={[
          { value: BEST, label: 'The best robot' },
          ...robots.map(({ id, name }) => ({ value: id, label: name })),
          ...(isGone ? [{ value: robotId, label: 'A robot that is gone', disabled: true }] : []),
        ]}
      />
    </Field>
  );
}
