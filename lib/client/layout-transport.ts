import {
  layoutChangesSchema,
  operationResultSchema,
  staleItemsSchema,
  type LayoutChanges,
  type OperationBatch,
} from '@/lib/contracts/layouts';
import { presenceAnswerSchema, type PresenceAnswer, type PresenceReport } from '@/lib/contracts/presence';
import type { SendAnswer } from '@/lib/editor/autosave';
import { fetcher, ProblemError, sayError, send } from './fetcher';

const address = (layoutId: string) => `/api/layouts/${encodeURIComponent(layoutId)}`;

/** Whether trying again later makes sense: no answer, a server in trouble, too many requests, or a session to renew. */
export function isPassing(error: unknown): boolean {
  if (!(error instanceof ProblemError)) return false;
  const { status } = error;
  return status === 0 || status === 401 || status === 408 || status === 429 || status >= 500;
}

function passingWords(error: ProblemError): string {
  if (error.status === 401) return 'You are signed out. Sign in in another window; your edits are kept and sent then.';
  if (error.status === 429) return 'The server asks for a pause. Your edits are kept and sent shortly.';
  return 'The server cannot be reached. Your edits are kept in this browser and sent when it can.';
}

/** Sends one batch of edits and says what became of it. Throws nothing. */
export async function sendBatch(layoutId: string, batch: OperationBatch): Promise<SendAnswer> {
  try {
    const result = await send('POST', `${address(layoutId)}/operations`, batch, operationResultSchema);
    return { kind: 'accepted', result };
  } catch (error) {
    if (error instanceof ProblemError && error.code === 'stale_item') {
      const stale = staleItemsSchema.safeParse(error.problem);
      if (stale.success) return { kind: 'stale', conflicts: stale.data.conflicts };
    }
    if (error instanceof ProblemError && isPassing(error)) return { kind: 'unreachable', message: passingWords(error) };
    return { kind: 'refused', message: sayError(error) };
  }
}

/** Others' changes after a version; null where they cannot be had just now. */
export async function askChanges(layoutId: string, since: number): Promise<LayoutChanges | null> {
  try {
    return await fetcher(`${address(layoutId)}/changes?since=${since}`, layoutChangesSchema);
  } catch {
    return null;
  }
}

/** Says where this planner is; answers where the others are, null where that cannot be had just now. */
export async function reportPresence(layoutId: string, report: PresenceReport): Promise<PresenceAnswer | null> {
  try {
    return await send('POST', `${address(layoutId)}/presence`, report, presenceAnswerSchema);
  } catch {
    return null;
  }
}
