'use client';

import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import type { Refusal } from '@/lib/layout/arm-import/imported-arm';
import type { ChosenChain, ReadSource } from './read-source';
import { RefusalList } from './refusal-list';

interface ImportOriginProps {
  source: ReadSource;
  notes: readonly string[];
  refusals: readonly Refusal[];
  onChain: (chain: ChosenChain) => void;
  onAnother: () => void;
}

/** The file a draft comes from, which chain of it is shown, and what was taken for granted. */
export function ImportOrigin({ source, notes, refusals, onChain, onAnother }: ImportOriginProps) {
  const { chain } = source;
  const isBare = !chain && notes.length === 0 && refusals.length === 0;
  return (
    <Panel
      title={source.name}
      aside={
        <Button variant="quiet" size="small" onClick={onAnother}>
          Another file
        </Button>
      }
      // Without a body its title line ends in two rules, and both lie on the next panel's.
      className={isBare ? '-mb-0.5' : '-mb-px'}
    >
      {(chain || notes.length > 0) && (
        <div className="flex flex-col gap-2.5 p-3.5">
          {chain && (
            <div className="grid gap-3 sm:grid-cols-2">
              <Field label="From the link">
                <Select
                  value={chain.base}
                  onValueChange={(base) => onChain({ base, tip: chain.tip })}
                  options={chain.bases.map((link) => ({ value: link, label: link }))}
                />
              </Field>
              <Field label="To the link">
                <Select
                  value={chain.tip}
                  onValueChange={(tip) => onChain({ base: chain.base, tip })}
                  options={chain.tips.map(({ link, moving, isEnd }) => ({
                    value: link,
                    label: link,
                    note: `${moving === 1 ? '1 joint' : `${moving} joints`}${isEnd ? ', end of a branch' : ''}`,
                  }))}
                />
              </Field>
            </div>
          )}
          {notes.length > 0 && (
            <ul className="flex flex-col gap-0.5">
              {notes.map((note) => (
                <li key={note}>{note}</li>
              ))}
            </ul>
          )}
        </div>
      )}
      <RefusalList refusals={refusals} />
    </Panel>
  );
}
