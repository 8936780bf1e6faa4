import type { Revision as RevisionAnswer, RevisionSummary } from '@/lib/contracts/revisions';
import type { Revision } from '@/models';
import type { PlacedRevision } from './data';

export function presentRevisionSummary(revision: Revision, projectId: string): RevisionSummary {
  return {
    id: revision.id,
    layoutId: revision.layoutId,
    projectId,
    number: revision.number,
    state: revision.state,
    note: revision.note,
    sha256: revision.sha256,
    issuedAt: revision.createdAt.toISOString(),
    issuedBy: revision.issuer?.name ?? 'a former member',
  };
}

export function presentRevision(revision: PlacedRevision): RevisionAnswer {
  return { ...presentRevisionSummary(revision, revision.layout.projectId), snapshot: revision.snapshot };
}
