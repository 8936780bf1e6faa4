import type { LayoutSummary } from '@/lib/contracts/layouts';
import type { Layout, Revision } from '@/models';
import { seesDrafts, type Actor } from '../policy';

const presentLatest = (revision: Revision | undefined): LayoutSummary['latestRevision'] =>
  revision ? { id: revision.id, number: revision.number, state: revision.state } : null;

/** Viewers read a variant as it was issued: neither its newer name nor the size of the draft is theirs to know. */
export function presentSummary(
  actor: Actor,
  layout: Layout,
  { latest, itemCount }: { latest?: Revision; itemCount: number },
): LayoutSummary {
  const issued = !seesDrafts(actor) && latest ? latest : null;
  return {
    id: layout.id,
    projectId: layout.projectId,
    letter: layout.letter,
    name: issued ? issued.snapshot.name : layout.name,
    version: issued ? issued.snapshot.layoutVersion : layout.version,
    floorPlanId: issued ? (issued.snapshot.floorPlan?.id ?? null) : layout.floorPlanId,
    latestRevision: presentLatest(latest),
    itemCount: issued ? issued.snapshot.items.length : itemCount,
    createdAt: (issued ?? layout).createdAt.toISOString(),
    updatedAt: issued ? issued.createdAt.toISOString() : layout.updatedAt.toISOString(),
  };
}
