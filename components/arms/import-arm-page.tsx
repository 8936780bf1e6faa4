'use client';

import { useState } from 'react';
import { draftOf } from '@/lib/editor/arm/draft';
import type { ImportedArm, Refusal } from '@/lib/layout/arm-import/imported-arm';
import { ImportOrigin } from './import-origin';
import { ImportSource } from './import-source';
import { NewArmEditor } from './new-arm-editor';
import { readSource, type ReadSource } from './read-source';

interface Shown {
  /** Another one for every file and every choice of links, so that the table starts anew. */
  readonly key: string;
  readonly source: ReadSource;
  readonly imported: ImportedArm;
}

/** An arm out of a file: chosen or pasted, looked at and completed, then added. */
export function ImportArmPage() {
  const [shown, setShown] = useState<Shown | null>(null);
  const [refusals, setRefusals] = useState<readonly Refusal[]>([]);
  const [text, setText] = useState('');

  const read = async (content: string, fileName: string): Promise<void> => {
    const answer = await readSource(content, fileName);
    if (!answer.ok) return setRefusals(answer.refusals);
    setRefusals([]);
    show(answer.value);
  };
  const show = (source: ReadSource): void => {
    const answer = source.arm();
    if (!answer.ok) return setRefusals(answer.refusals);
    setRefusals([]);
    setShown({ key: `${source.name} ${source.chain?.base} ${source.chain?.tip}`, source, imported: answer.value });
  };

  if (!shown)
    return <ImportSource text={text} onText={setText} refusals={refusals} onRead={read} onRefuse={setRefusals} />;
  const { key, source, imported } = shown;
  return (
    <NewArmEditor
      key={key}
      isImported
      start={() =>
        draftOf({
          name: imported.name,
          description: imported.description,
          payloadKg: imported.payloadKg,
          definition: mutableCopy(imported.arm),
        })
      }
      origin={
        <ImportOrigin
          source={source}
          notes={imported.notes}
          refusals={refusals}
          onChain={(chain) => show(source.withChain(chain))}
          onAnother={() => {
            setShown(null);
            setRefusals([]);
          }}
        />
      }
    />
  );
}

/** The contract's arm is not read-only. */
const mutableCopy = (arm: ImportedArm['arm']) => structuredClone(arm) as Parameters<typeof draftOf>[0]['definition'];
