import type { Transaction } from 'sequelize';
import type { SignOffState } from '@/lib/contracts/sign-offs';
import type { Actor } from '../policy';
import { findRevision } from '../revisions/data';
import { signOffsOf } from './data';
import { presentSignOff } from './present';

/** Where a revision stands and who has said what to it so far. */
export async function readSignOffs(actor: Actor, revisionId: string, transaction?: Transaction): Promise<SignOffState> {
  const { state } = await findRevision(actor, revisionId, transaction);
  const signOffs = await signOffsOf(revisionId, transaction);
  return { state, signOffs: signOffs.map((signOff) => presentSignOff(signOff, actor)) };
}
