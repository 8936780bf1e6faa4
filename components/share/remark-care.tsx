'use client';

import { useState } from 'react';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { sayError } from '@/lib/client/fetcher';
import type { Review } from '@/lib/client/use-review';
import type { Person, Remark } from '@/lib/contracts/remarks';

interface RemarkCareProps {
  readonly remark: Remark;
  readonly people: readonly Person[];
  readonly assign: NonNullable<Review['assign']>;
}

const NOBODY = 'nobody';

/** Whose a remark is to deal with, and until when; kept as soon as it is chosen. */
export function RemarkCare({ remark, people, assign }: RemarkCareProps) {
  const [fault, setFault] = useState<string | null>(null);
  const keep = async (change: Parameters<typeof assign>[1]) => {
    setFault(null);
    try {
      await assign(remark.id, change);
    } catch (error) {
      setFault(sayError(error));
    }
  };
  const planners = people.filter(({ side }) => side === 'integrator');
  return (
    <div className="grid grid-cols-2 gap-2.5">
      <Field label="Given to" error={fault}>
        <Select
          aria-label={`Remark ${remark.number} is given to`}
          value={remark.assignee?.id ?? NOBODY}
          onValueChange={(id) => void keep({ assigneeId: id === NOBODY ? null : id })}
          options={[
            { value: NOBODY, label: 'Nobody' },
            ...planners.map(({ id, name }) => ({ value: id, label: name })),
          ]}
        />
      </Field>
      <Field label="Due on">
        <TextInput
          type="date"
          // Kept on leaving the field: a day is typed figure by figure.
          key={remark.dueOn}
          defaultValue={remark.dueOn ?? ''}
          onBlur={({ target }) => {
            const dueOn = target.value || null;
            if (dueOn !== remark.dueOn) void keep({ dueOn });
          }}
        />
      </Field>
    </div>
  );
}
