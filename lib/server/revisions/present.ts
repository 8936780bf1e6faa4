import type { Revision as RevisionAnswer, RevisionSummary } from '@/lib/contracts/revisions';
import type { Revision } from '@/models';
import type { Actor } from '../policy';
import { presentSignOff } from '../sign-offs/present';
import type { PlacedRevision } from './data';

export function presentRevisionSummary(actor: Actor, revision: Revision, projectId: string): RevisionSummary {
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
    signOffs: (revision.signOffs ?? []).map((signOff) => presentSignOff(signOff, actor)),
  };
}

export function presentRevision(actor: Actor, revision: PlacedRevision): RevisionAnswer {
  return { ...presentRevisionSummary(actor, revision, revision.layout.projectId), snapshot: revision.snapshot };
}
