'use client';

import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import type { SheetRef } from '@/lib/client/sheet-ref';
import { useAnswer } from '@/lib/client/use-answer';
import { remarkListSchema, type Remark } from '@/lib/contracts/remarks';

/** The remarks on a draft's revisions, or on one revision; null while they are read. */
export function useRemarksOn(ref: SheetRef | null): readonly Remark[] | null {
  const where = ref?.kind === 'layout' ? 'layouts' : 'revisions';
  const { data } = useAnswer(ref && `/api/${where}/${ref.id}/remarks`, remarkListSchema);
  return data?.remarks ?? null;
}

interface RemarksOnSheetProps {
  readonly name: string;
  readonly remarks: readonly Remark[] | null;
}

/** Open remarks on the left sheet, newest first: what the right one should answer. */
export function RemarksOnSheet({ name, remarks }: RemarksOnSheetProps) {
  const open = (remarks ?? []).filter(({ resolvedAt }) => !resolvedAt).sort((a, b) => b.number - a.number);
  return (
    <Panel
      title={`Remarks on sheet ${name}`}
      aside={<span className="font-mono font-medium text-ink">{remarks ? `${open.length} open` : ''}</span>}
      className="border-t-0"
    >
      {remarks && open.length === 0 && <p className="px-3.5 py-3 text-ink-soft">None open.</p>}
      <ul className="px-3.5 py-1.5">
        {open.map(({ id, number, body, author, createdAt }) => (
          <li key={id} className="flex gap-2.5 py-1">
            <span className="font-mono font-semibold">{number}</span>
            <span className="min-w-0">
              {body}{' '}
              <span className="text-ink-soft">
                {author.you ? 'You' : author.name}, <Moment iso={createdAt} />
              </span>
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
