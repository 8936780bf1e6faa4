'use client';

import { FileUp } from 'lucide-react';
import { useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Field } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { TextArea } from '@/components/ui/text-input';
import { TitleBlock } from '@/components/ui/title-block';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import type { Refusal } from '@/lib/layout/arm-import/imported-arm';
import { FormatHelp } from './format-help';
import { RefusalList } from './refusal-list';
import { textOfFile } from './read-source';

interface ImportSourceProps {
  text: string;
  onText: (text: string) => void;
  refusals: readonly Refusal[];
  onRead: (text: string, fileName: string) => Promise<void>;
  onRefuse: (refusals: readonly Refusal[]) => void;
}

/** Where an arm comes from: a file that is chosen or dropped, or a text that is pasted. */
export function ImportSource({ text, onText, refusals, onRead, onRefuse }: ImportSourceProps) {
  const chooser = useRef<HTMLInputElement>(null);
  const [isOver, setIsOver] = useState(false);
  const take = async (file: File | undefined): Promise<void> => {
    if (!file) return;
    const content = await textOfFile(file);
    if (content === null)
      return onRefuse([
        { where: file.name, message: 'The file is larger than 1 MB. A description of one arm takes a few kilobytes.' },
      ]);
    await onRead(content, file.name);
  };
  return (
    <>
      <TitleBlock
        cells={[{ label: 'Arm library', value: 'Import an arm', heading: true }]}
        actions={
          <LinkButton href="/arms" variant="quiet">
            Cancel
          </LinkButton>
        }
      />
      <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_29rem]">
        <Panel title="A DH table as CSV, or a URDF file">
          <div
            onDragOver={(event) => {
              event.preventDefault();
              setIsOver(true);
            }}
            onDragLeave={() => setIsOver(false)}
            onDrop={(event) => {
              event.preventDefault();
              setIsOver(false);
              void take(event.dataTransfer.files[0]);
            }}
            className={classNames(
              'flex flex-wrap items-center gap-3 border-b border-rule p-3.5',
              isOver && 'bg-petrol-wash',
            )}
          >
            <Button variant="action" onClick={() => chooser.current?.click()}>
              <FileUp aria-hidden className="size-4" />
              Choose a file
            </Button>
            <span className="text-ink-soft">or drop it here. Up to 1 MB.</span>
            <VisuallyHidden>
              <input
                ref={chooser}
                type="file"
                tabIndex={-1}
                aria-label="Arm file"
                accept=".csv,.tsv,.txt,.urdf,.xml,text/csv,application/xml"
                onChange={(event) => {
                  void take(event.target.files?.[0]);
                  // The same file again, mended, is a change too.
                  event.target.value = '';
                }}
              />
            </VisuallyHidden>
          </div>
          <form
            className="flex flex-col items-start gap-2.5 p-3.5"
            onSubmit={(event) => {
              event.preventDefault();
              void onRead(text, 'Pasted text');
            }}
          >
            <Field label="Or paste its text" className="w-full">
              <TextArea
                rows={10}
                value={text}
                spellCheck={false}
                className="font-mono text-sm"
                onChange={(event) => onText(event.target.value)}
              />
            </Field>
            <Button type="submit" disabled={text.trim() === ''}>
              Read the text
            </Button>
          </form>
          <RefusalList refusals={refusals} />
        </Panel>
        <FormatHelp />
      </Page>
    </>
  );
}
