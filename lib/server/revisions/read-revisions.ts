import type { Transaction } from 'sequelize';
import type { Revision as RevisionAnswer, RevisionSummary } from '@/lib/contracts/revisions';
import { findLayout } from '../layouts/data';
import type { Actor } from '../policy';
import { findRevision, revisionsOf } from './data';
import { presentRevision, presentRevisionSummary } from './present';

/** Newest first. */
export async function listRevisions(
  actor: Actor,
  layoutId: string,
  transaction?: Transaction,
): Promise<RevisionSummary[]> {
  const layout = await findLayout(actor, layoutId, transaction);
  const revisions = await revisionsOf(layout, transaction);
  return revisions.map((revision) => presentRevisionSummary(actor, revision, layout.projectId));
}

export async function readRevision(
  actor: Actor,
  revisionId: string,
  transaction?: Transaction,
): Promise<RevisionAnswer> {
  return presentRevision(actor, await findRevision(actor, revisionId, transaction));
}
