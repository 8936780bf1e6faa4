import { questionOfRobot } from '@/lib/layout/map-question';
import { storedItemsOf } from '@/lib/server/layouts/data';
import { askMap } from '@/lib/server/maps';
import { computeTile, summarise } from '@/lib/server/maps/compute';
import type { MapComputer } from '@/lib/server/maps/computer';
import { runMapTile } from '@/lib/server/maps/run-tile';
import type { MemberActor } from '@/lib/server/policy';
import type { Layout } from '@/models';

const here: MapComputer = {
  computeTile: async (task) => computeTile(task),
  summarise: async (task) => summarise(task),
};

/** Asks for the map of every robot on the layout and answers it here and now; a worker that comes later finds it done. */
export async function finishMaps(actor: MemberActor, layout: Layout): Promise<void> {
  for (const { item } of await storedItemsOf(layout.id)) {
    if (item.kind !== 'robot') continue;
    const map = await askMap(actor, questionOfRobot(item, layout.mapSettings));
    if (map.state === 'done') continue;
    for (let index = 0; index < map.tileCount; index += 1) {
      await runMapTile({ mapId: map.id, attempt: map.attempt, index }, here);
    }
  }
}
