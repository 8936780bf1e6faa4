import { classNames } from '@/components/ui/class-names';
import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { Panel } from '@/components/ui/panel';
import type { ChangedItem } from './use-comparison';

const TONES = { better: 'text-green', worse: 'text-red', none: 'text-ink-soft' } as const;
/** More than these would push the numbers off the screen; the rest is said as a count. */
const SHOWN_EFFECTS = 3;

/** What was moved, turned, added or taken away between the two sheets, and what that does. */
export function ChangedPanel({ changed }: { readonly changed: readonly ChangedItem[] }) {
  return (
    <Panel
      title="Moved between the two sheets"
      aside={<span className="font-mono font-medium text-ink">{changed.length}</span>}
    >
      {changed.length === 0 ? (
        <p className="px-3.5 py-3 text-ink-soft">Everything stands alike on both.</p>
      ) : (
        <DataTable caption="Things that differ between the two sheets">
          <thead>
            <tr>
              <HeadCell>Item</HeadCell>
              <HeadCell figures>Move</HeadCell>
              <HeadCell className="text-right">Effect</HeadCell>
            </tr>
          </thead>
          <tbody>
            {changed.map((difference) => (
              <DataRow key={`${difference.itemId} ${difference.what}`}>
                <DataCell className="h-7.5! py-0.5!">{difference.what}</DataCell>
                <DataCell figures className="h-7.5! py-0.5! text-[0.875rem]">
                  {difference.change}
                </DataCell>
                <DataCell className="h-7.5! py-0.5! text-right">
                  {difference.effects.slice(0, SHOWN_EFFECTS).map(({ words, direction }) => (
                    <span key={words} className={classNames('block leading-snug', TONES[direction])}>
                      {words}
                    </span>
                  ))}
                  {difference.effects.length > SHOWN_EFFECTS && (
                    <span className="block text-sm text-ink-soft">
                      and {difference.effects.length - SHOWN_EFFECTS} more
                    </span>
                  )}
                </DataCell>
              </DataRow>
            ))}
          </tbody>
        </DataTable>
      )}
    </Panel>
  );
}
