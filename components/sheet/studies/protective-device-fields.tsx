'use client';

import { CornerList } from '@/components/sheet/panels/corner-list';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { ValueField } from '@/components/sheet/panels/value-field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { protectiveDistance, type DistanceField } from '@/lib/layout/protective/protective-distance';
import type { ProtectiveDevice } from '@/lib/layout/items';
import { Cautions } from './cautions';
import { OptionalField } from './optional-field';
import { ProtectiveResult } from './protective-result';

interface OptionalRow {
  readonly field: DistanceField | 'reachOverMm';
  readonly label: string;
  readonly kind: 'length' | 'number';
  readonly unit?: string;
  readonly when?: (device: ProtectiveDevice) => boolean;
}

const ROWS: readonly OptionalRow[] = [
  { field: 'stopS', label: 'Machine stops within', kind: 'number', unit: 's' },
  { field: 'responseS', label: 'Device and control', kind: 'number', unit: 's' },
  { field: 'detectionMm', label: 'Detects from (d)', kind: 'length', when: ({ form }) => form === 'curtain' },
  {
    field: 'fieldHeightMm',
    label: 'Field height (H)',
    kind: 'length',
    when: ({ form, edition }) => form === 'field' && edition === '2010',
  },
  { field: 'supplementMm', label: 'Supplement', kind: 'length', when: ({ edition }) => edition === '2024' },
  { field: 'reachOverMm', label: 'C, reaching over', kind: 'length', when: ({ form }) => form === 'curtain' },
  { field: 'ownAddedMm', label: 'C, own value', kind: 'length' },
];

/** Everything that a protective distance hangs on, the distance itself, and what it leaves open. */
export function ProtectiveDeviceFields({ item }: { readonly item: ProtectiveDevice }) {
  const edit = useItemEdit(item);
  const answer = protectiveDistance(item);
  const questions = new Map<string, string>(
    answer.told ? [] : answer.questions.map(({ field, words }) => [field, words]),
  );
  return (
    <>
      <div className="mt-2 grid gap-2">
        <SegmentedControl
          label="How people come"
          value={item.form}
          disabled={item.locked}
          onValueChange={(form) => edit('Form', { form })}
          options={[
            { value: 'curtain', label: 'At right angles' },
            { value: 'field', label: 'Along the field' },
          ]}
        />
        <SegmentedControl
          label="Edition of ISO 13855"
          value={item.edition}
          disabled={item.locked}
          onValueChange={(edition) => edit('Edition', { edition })}
          options={[
            { value: '2010', label: 'ISO 13855:2010' },
            { value: '2024', label: 'ISO 13855:2024' },
          ]}
        />
      </div>
      <div className="mt-2 grid grid-cols-2 gap-x-3 gap-y-2">
        {ROWS.filter(({ when }) => !when || when(item)).map(({ field, label, kind, unit }) => (
          <OptionalField
            key={field}
            label={label}
            kind={kind}
            unit={unit}
            value={item[field]}
            question={questions.get(field)}
            disabled={item.locked}
            onCommit={(value) => edit(label, { [field]: value })}
          />
        ))}
        <ValueField
          label="K, quick approach"
          kind="number"
          unit="mm/s"
          step={100}
          value={item.fastMmS}
          disabled={item.locked}
          onCommit={(fastMmS) => edit('Approach speed', { fastMmS })}
        />
        <ValueField
          label="K, walking"
          kind="number"
          unit="mm/s"
          step={100}
          value={item.slowMmS}
          disabled={item.locked}
          onCommit={(slowMmS) => edit('Approach speed', { slowMmS })}
        />
      </div>
      <ProtectiveResult answer={answer} />
      <Cautions />
      <CornerList
        points={item.pointsMm}
        least={2}
        disabled={item.locked}
        onChange={(pointsMm) => edit('Corners', { pointsMm })}
      />
    </>
  );
}
