import type { Transaction } from 'sequelize';
import type { ExportSubject } from '@/lib/contracts/exports';
import type { RevisionSummary, Snapshot } from '@/lib/contracts/revisions';
import { inTransaction } from '../database';
import { findLayout } from '../layouts/data';
import { demandRole, type Actor } from '../policy';
import { findRevision } from '../revisions/data';
import { presentRevisionSummary } from '../revisions/present';
import { takeSnapshot } from '../revisions/snapshot';

/** A sheet as it is handed over: a frozen copy, and for an issued one which revision it is. */
export interface HandedSheet {
  readonly projectId: string;
  readonly layoutId: string;
  readonly snapshot: Snapshot;
  /** Null for a draft. */
  readonly revision: RevisionSummary | null;
}

/**
 * The sheet that a member or a guest may take away; a draft only for those who may see drafts.
 * @throws 404 for what is not theirs, 403 for a draft that a viewer asks for.
 */
export async function handedSheet(
  actor: Actor,
  subject: ExportSubject,
  subjectId: string,
  outer?: Transaction,
): Promise<HandedSheet> {
  return inTransaction(async (transaction) => {
    if (subject === 'revisions') {
      const revision = await findRevision(actor, subjectId, transaction);
      const { layoutId, snapshot, layout } = revision;
      const summary = presentRevisionSummary(actor, revision, layout.projectId);
      return { projectId: layout.projectId, layoutId, snapshot, revision: summary };
    }
    demandRole(actor, 'planner');
    // Held, so that the copy is of one moment.
    const layout = await findLayout(actor, subjectId, transaction, { lock: true });
    const snapshot = await takeSnapshot(actor, layout, transaction);
    return { projectId: layout.projectId, layoutId: layout.id, snapshot, revision: null };
  }, outer);
}

/** Words of a sheet for the name of a file: `pump-housing-line-A-rev-2`. */
export function fileStem({ snapshot, revision }: HandedSheet): string {
  const words = `${snapshot.projectName} ${snapshot.letter} ${revision ? `rev ${revision.number}` : 'draft'}`;
  const plain = words.normalize('NFKD').replace(/[^A-Za-z0-9]+/g, '-');
  return plain.replace(/^-|-$/g, '').slice(0, 80) || 'layout';
}
