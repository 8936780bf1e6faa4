import { http, HttpResponse } from 'msw';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { LibraryArm } from '@/lib/contracts/arms';
import type { Layout, OperationBatch } from '@/lib/contracts/layouts';
import type { OtherPlanner } from '@/lib/contracts/presence';
import type { Remark } from '@/lib/contracts/remarks';
import { FakeLayoutServer } from '@/lib/editor/testing/fake-layout-server';
import type { Item } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { api } from '@/tests/components/api';
import { fakeId } from '@/tests/components/fakes';

const NOW = '2031-05-04T08:00:00.000Z';

export const ARM: LibraryArm = {
  id: fakeId(70),
  familyId: fakeId(71),
  version: 1,
  name: 'Six-axis 12 kg, 1.4 m',
  description: '',
  payloadKg: 12,
  reachMm: 1420,
  definition: BUILT_IN_ARMS[1].arm as LibraryArm['definition'],
  createdAt: NOW,
  latest: true,
  archivedAt: null,
  layoutCount: 0,
};

/** One layout as its routes answer it, with the rules of the real ones and a line that can be cut. */
export class SheetServer {
  readonly layout = new FakeLayoutServer();
  readonly batches: OperationBatch[] = [];
  readonly mapQuestions: unknown[] = [];
  remarks: Remark[] = [];
  others: OtherPlanner[] = [];
  line: 'up' | 'down' = 'up';
  /** Runs once, just before the next batch is looked at: somebody was faster. */
  faster: (() => void) | null = null;

  readonly projectId = fakeId(1);
  readonly layoutId = fakeId(2);

  put(...items: Item[]): void {
    this.layout.take({
      id: crypto.randomUUID(),
      operations: items.map((item) => ({ type: 'put', baseVersion: this.versionOf(item.id), item })),
    });
  }

  versionOf(itemId: string): number {
    return this.layout.items.find(({ item }) => item.id === itemId)?.version ?? 0;
  }

  named(name: string): Item | undefined {
    return this.layout.items.find(({ item }) => item.name === name)?.item;
  }

  /** Answers the page's requests from here on. */
  listen(): void {
    const layout = `*/api/layouts/${this.layoutId}`;
    api.use(
      http.get(layout, () => HttpResponse.json(this.answer())),
      http.patch(layout, () => HttpResponse.json(this.answer())),
      http.get(`${layout}/changes`, ({ request }) =>
        HttpResponse.json(this.layout.changes(Number(new URL(request.url).searchParams.get('since')))),
      ),
      http.post(`${layout}/operations`, async ({ request }) => this.take((await request.json()) as OperationBatch)),
      http.post(`${layout}/presence`, () =>
        HttpResponse.json({ layoutVersion: this.layout.version, others: this.others }),
      ),
      http.get(`${layout}/revisions`, () => HttpResponse.json({ revisions: [] })),
      http.get(`${layout}/remarks`, () => HttpResponse.json({ remarks: this.remarks })),
      http.get('*/api/arms', () => HttpResponse.json({ arms: [ARM] })),
      http.get('*/api/fixtures', () => HttpResponse.json({ fixtures: [] })),
      http.get(`*/api/projects/${this.projectId}/floor-plans`, () => HttpResponse.json({ floorPlans: [] })),
      http.post('*/api/maps', async ({ request }) => {
        this.mapQuestions.push(await request.json());
        return HttpResponse.json(QUEUED_MAP, { status: 202 });
      }),
      http.get('*/api/maps/:mapId', () => HttpResponse.json(QUEUED_MAP)),
    );
  }

  private take(batch: OperationBatch) {
    if (this.line === 'down') return HttpResponse.error();
    this.batches.push(batch);
    this.faster?.();
    this.faster = null;
    const answer = this.layout.take(batch);
    if (answer.kind === 'accepted') return HttpResponse.json(answer.result);
    if (answer.kind !== 'stale') throw new Error('The fake server refuses stale batches only.');
    const body = {
      type: 'about:blank',
      title: 'Stale',
      status: 409,
      code: 'stale_item',
      detail: 'Newer.',
      requestId: 'test',
    };
    return HttpResponse.json({ ...body, conflicts: answer.conflicts }, { status: 409 });
  }

  private answer(): Layout {
    return {
      id: this.layoutId,
      projectId: this.projectId,
      letter: 'B',
      name: 'robots face to face',
      version: this.layout.version,
      floorPlanId: null,
      latestRevision: null,
      itemCount: this.layout.items.length,
      createdAt: NOW,
      updatedAt: NOW,
      projectName: 'Pump housing line, bay 4',
      mapSettings: mapSettingsSchema.parse({}),
      items: [...this.layout.items],
      floorPlan: null,
      arms: [ARM],
    };
  }
}

const QUEUED_MAP = {
  id: fakeId(80),
  key: 'a'.repeat(64),
  state: 'queued',
  progress: { done: 0, total: 4 },
  failure: null,
  grid: { originMm: [-1500, -1500], stepMm: 25, columns: 121, rows: 121 },
  summary: null,
  askedAt: NOW,
  finishedAt: null,
};
