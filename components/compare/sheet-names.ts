import type { SheetDocument } from '@/lib/client/sheet-document';

/** What two compared sheets are called for short: their letters, or letter and mark where both are of one variant. */
export function shortNames(left: SheetDocument, right: SheetDocument): readonly [string, string] {
  const needsMark = left.letter === right.letter;
  const name = ({ letter, mark }: SheetDocument) => (needsMark ? `${letter} ${mark}` : letter);
  return [name(left), name(right)];
}
