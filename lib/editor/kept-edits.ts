import { z } from 'zod';
import {
  operationBatchSchema,
  operationSchema,
  type Operation,
  type OperationBatch,
  type OperationResult,
} from '@/lib/contracts/layouts';
import { operationItemId } from '@/lib/layout/operations';
import type { SendAnswer } from './autosave';

/** What waits to be saved, as it outlives a reload. */
export const keptEditsSchema = z.object({
  inFlight: operationBatchSchema.nullable(),
  edits: z.array(operationSchema),
});
export type KeptEdits = z.infer<typeof keptEditsSchema>;

/** Reads what was kept; null for nothing, or for something that this version cannot read. */
export function readKept(text: string | null): KeptEdits | null {
  if (!text) return null;
  try {
    const parsed = keptEditsSchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/**
 * Settles what an earlier visit left, before the sheet is loaded: the batch without an answer is sent once more under its id,
 * so that the layout loaded afterwards holds it for certain or certainly does not. Answers the edits still to be made, on the
 * versions they are now based on; null while the server cannot be reached.
 */
export async function settleKept(
  kept: KeptEdits,
  send: (batch: NonNullable<KeptEdits['inFlight']>) => Promise<SendAnswer>,
): Promise<Operation[] | null> {
  if (!kept.inFlight) return kept.edits;
  const answer = await send(kept.inFlight);
  if (answer.kind === 'unreachable') return null;
  return answer.kind === 'accepted'
    ? onAccepted(kept.edits, kept.inFlight, answer.result)
    : onRefused(kept.edits, kept.inFlight);
}

/** The batch is in: later edits of its items are based on the versions it made. */
function onAccepted(edits: readonly Operation[], batch: OperationBatch, result: OperationResult): Operation[] {
  const versions = new Map(result.items.map(({ id, version }) => [id, version]));
  const sent = new Set(batch.operations.map(operationItemId));
  return edits.map((edit) => {
    const itemId = operationItemId(edit);
    return sent.has(itemId) ? { ...edit, baseVersion: versions.get(itemId) ?? 0 } : edit;
  });
}

/** The batch is not in: its operations are edits again, and later edits of its items replace them on their versions. */
function onRefused(edits: readonly Operation[], batch: OperationBatch): Operation[] {
  const later = new Map(edits.map((edit) => [operationItemId(edit), edit]));
  const resumed = batch.operations.map((operation) => {
    const edit = later.get(operationItemId(operation));
    later.delete(operationItemId(operation));
    return edit ? { ...edit, baseVersion: operation.baseVersion } : operation;
  });
  // An item that was made and removed again before the server ever had it.
  const real = resumed.filter(({ type, baseVersion }) => type === 'put' || baseVersion > 0);
  return [...real, ...later.values()];
}

/** Two tabs left edits of one sheet behind: the later list wins item by item. */
export function joinKept(lists: readonly (readonly Operation[])[]): Operation[] {
  const byItem = new Map<string, Operation>();
  for (const list of lists) for (const edit of list) byItem.set(operationItemId(edit), edit);
  return [...byItem.values()];
}
