import { idSchema } from '@/lib/contracts/common';

/** A sheet as an address names it: a draft or a revision. */
export interface SheetRef {
  readonly kind: 'layout' | 'revision';
  readonly id: string;
}

/** Reads `layout:ID` or `revision:ID`; null for anything else. */
export function parseSheetRef(text: string | null | undefined): SheetRef | null {
  const [kind, id] = (text ?? '').split(':');
  if (kind !== 'layout' && kind !== 'revision') return null;
  return idSchema.safeParse(id).success ? { kind, id } : null;
}

export function sheetRefText({ kind, id }: SheetRef): string {
  return `${kind}:${id}`;
}
