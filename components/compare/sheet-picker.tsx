'use client';

import { ChevronDown } from 'lucide-react';
import { Fragment } from 'react';
import { Menu, MenuChoice, MenuHeading, MenuRule } from '@/components/ui/menu';
import { sayMoment } from '@/components/ui/moment';
import { sheetRefText, type SheetRef } from '@/lib/client/sheet-ref';
import type { VariantChoices } from '@/lib/client/use-sheet-choices';

interface SheetPickerProps {
  readonly label: string;
  readonly choices: readonly VariantChoices[];
  readonly chosen: SheetRef | null;
  /** Those who may not see drafts are offered revisions only. */
  readonly withDrafts: boolean;
  readonly onChoose: (ref: string) => void;
}

/** Picks a draft or a revision; looks like the value of a title block cell. */
export function SheetPicker({ label, choices, chosen, withDrafts, onChoose }: SheetPickerProps) {
  return (
    <Menu
      align="start"
      trigger={
        <button
          type="button"
          aria-label={`${label}: ${chosenName(choices, chosen)}. Choose another one.`}
          className="-mx-1 flex max-w-full items-center gap-1 rounded px-1 hover:bg-petrol-wash"
        >
          <span className="truncate">{chosenName(choices, chosen)}</span>
          <ChevronDown aria-hidden className="size-4 shrink-0" />
        </button>
      }
    >
      {choices.map(({ layout, revisions }, index) => (
        <Fragment key={layout.id}>
          {index > 0 && <MenuRule />}
          <MenuHeading>
            {layout.letter} · {layout.name}
          </MenuHeading>
          <MenuChoice
            label={`${layout.letter} · ${layout.name}`}
            value={chosen ? sheetRefText(chosen) : ''}
            onValueChange={onChoose}
            options={[
              ...(withDrafts ? [{ value: `layout:${layout.id}`, label: 'Draft, as it is now' }] : []),
              ...revisions.map(({ id, number, issuedAt }) => ({
                value: `revision:${id}`,
                label: `Revision ${number}, issued ${sayMoment(new Date(issuedAt))}`,
              })),
            ]}
          />
        </Fragment>
      ))}
    </Menu>
  );
}

function chosenName(choices: readonly VariantChoices[], chosen: SheetRef | null): string {
  if (!chosen) return 'Choose';
  for (const { layout, revisions } of choices) {
    const name = `${layout.letter} · ${layout.name}`;
    if (chosen.kind === 'layout' && layout.id === chosen.id) return `${name}, draft`;
    const revision = revisions.find(({ id }) => chosen.kind === 'revision' && id === chosen.id);
    if (revision) return `${name}, rev. ${revision.number}`;
  }
  return 'Not in this project';
}
