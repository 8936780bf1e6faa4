import { parseSheetRef, type SheetRef } from '@/lib/client/sheet-ref';
import { type VariantChoices } from '@/lib/client/use-sheet-choices';

/** What the address names, and where it names nothing the first two sheets that the reader may see. */
export function chosenSheets(
  search: { get(name: string): string | null },
  choices: readonly VariantChoices[] | null,
  withDrafts: boolean,
): readonly [SheetRef | null, SheetRef | null] {
  const [left, right] = [parseSheetRef(search.get('left')), parseSheetRef(search.get('right'))];
  if ((left && right) || !choices) return [left, right];
  const all = choices.flatMap(({ layout, revisions }): SheetRef[] =>
    withDrafts ? [{ kind: 'layout', id: layout.id }] : revisions.map(({ id }) => ({ kind: 'revision', id })),
  );
  const others = (taken: SheetRef | null) => all.find(({ id }) => id !== taken?.id) ?? null;
  const first = left ?? others(right);
  return [first, right ?? others(first)];
}
