import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { verdictsOf } from '@/lib/server/judging/judge-sheet';
import { readLayout } from '@/lib/server/layouts/read-layouts';

const params = z.object({ layoutId: idSchema });

export const GET = route({ role: 'planner', params }, async ({ actor, params }) => {
  const { items, ...layout } = await readLayout(actor, params.layoutId);
  return verdictsOf({ ...layout, items: items.map(({ item }) => item) });
});
