'use client';

import { emptyDraft } from '@/lib/editor/arm/draft';
import { ForIntegrators } from './for-integrators';
import { NewArmEditor } from './new-arm-editor';

/** An arm from an empty table. */
export function NewArmPage() {
  return (
    <ForIntegrators>
      <NewArmEditor start={emptyDraft} />
    </ForIntegrators>
  );
}
