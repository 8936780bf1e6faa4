import type { LayoutChanges, OperationBatch, StoredItem } from '@/lib/contracts/layouts';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { applyOperations, operationItemId } from '@/lib/layout/operations';
import type { SendAnswer } from '../autosave';

/** The rules of the operations and changes routes, in memory: batches once each, all or nothing, versions that only grow. */
export class FakeLayoutServer {
  items: readonly StoredItem[] = [];
  version = 1;
  readonly answers = new Map<string, SendAnswer>();
  /** Every accepted edit with the version it made, in order. */
  readonly accepted: { itemId: string; baseVersion: number; version: number }[] = [];
  private readonly lastVersions = new Map<string, number>();
  private readonly changedAt = new Map<string, number>();

  take(batch: OperationBatch): SendAnswer {
    const repeated = this.answers.get(batch.id);
    if (repeated) return repeated;
    const { items, conflicts } = applyOperations(this.items, batch.operations, this.lastVersions);
    if (conflicts.length > 0) return { kind: 'stale', conflicts };
    this.items = items;
    this.version += 1;
    const versions = new Map(items.map((entry) => [entry.item.id, entry.version]));
    const made: { id: string; version: number }[] = [];
    for (const operation of batch.operations) {
      const itemId = operationItemId(operation);
      const version = versions.get(itemId) ?? (this.lastVersions.get(itemId) ?? 0) + 1;
      this.lastVersions.set(itemId, version);
      this.changedAt.set(itemId, this.version);
      this.accepted.push({ itemId, baseVersion: operation.baseVersion, version });
      if (operation.type === 'put') made.push({ id: itemId, version });
    }
    const answer: SendAnswer = { kind: 'accepted', result: { layoutVersion: this.version, items: made } };
    this.answers.set(batch.id, answer);
    return answer;
  }

  changes(since: number): LayoutChanges {
    const isNew = (itemId: string) => (this.changedAt.get(itemId) ?? 0) > since;
    const there = new Set(this.items.map(({ item }) => item.id));
    return {
      layoutVersion: this.version,
      items: this.items.filter(({ item }) => isNew(item.id)),
      removed: [...this.changedAt.keys()].filter((itemId) => isNew(itemId) && !there.has(itemId)),
      mapSettings: mapSettingsSchema.parse({}),
      floorPlanId: null,
    };
  }
}
