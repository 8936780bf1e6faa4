'use client';

import { Dialog } from '@/components/ui/dialog';
import { SHORTCUTS } from '@/lib/editor/shortcuts';

interface ShortcutsDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}

export function ShortcutsDialog({ open, onOpenChange }: ShortcutsDialogProps) {
  return (
    <Dialog wide open={open} onOpenChange={onOpenChange} title="Keys and gestures">
      {/* The list scrolls, so the keyboard has to be able to stand on it. */}
      <div tabIndex={0} role="group" aria-label="All keys" className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
        {SHORTCUTS.map(({ title, entries }) => (
          <section key={title}>
            <h3 className="mb-1 text-sm font-medium text-ink-soft">{title}</h3>
            <dl className="text-sm">
              {entries.map(({ keys, words }) => (
                <div key={words} className="flex items-baseline justify-between gap-4 border-t border-hair py-1">
                  <dt className="order-last flex shrink-0 gap-1">
                    {keys.map((key) => (
                      <kbd key={key} className="rounded border border-ink-soft px-1.5 text-xs leading-5">
                        {key}
                      </kbd>
                    ))}
                  </dt>
                  <dd>{words}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
    </Dialog>
  );
}
