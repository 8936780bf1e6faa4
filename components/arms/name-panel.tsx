'use client';

import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { TextArea, TextInput } from '@/components/ui/text-input';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { setCell } from '@/lib/editor/arm/edits';
import type { ChangeDraft } from './draft-table';

interface NamePanelProps {
  draft: ArmDraft;
  problems: readonly DraftProblem[];
  onChange: ChangeDraft;
  className?: string;
}

/** What the arm is called, carries and is for. */
export function NamePanel({ draft, problems, onChange, className }: NamePanelProps) {
  const isWrong = (path: string): boolean => problems.some(({ paths }) => paths.includes(path));
  const set = (path: string) => (event: { target: { value: string } }) =>
    onChange((old) => setCell(old, path, event.target.value));
  return (
    <Panel title="Name and payload" padded className={className}>
      <div className="grid gap-3 sm:grid-cols-[minmax(0,1fr)_9rem]">
        <Field label="Name">
          <TextInput
            data-cell="name"
            value={draft.name}
            autoComplete="off"
            placeholder="Six-axis 12 kg, 1.4 m"
            aria-invalid={isWrong('name') || undefined}
            onChange={set('name')}
          />
        </Field>
        <Field label="Payload (kg)">
          <TextInput
            data-cell="payloadKg"
            value={draft.payloadKg.text}
            autoComplete="off"
            aria-invalid={isWrong('payloadKg') || undefined}
            className="text-right font-mono"
            onChange={set('payloadKg')}
          />
        </Field>
        <Field label="What it is for" className="sm:col-span-2">
          <TextArea data-cell="description" rows={2} value={draft.description} onChange={set('description')} />
        </Field>
      </div>
    </Panel>
  );
}
