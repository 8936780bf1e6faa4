import { mapQuestionSchema } from '@/lib/contracts/maps';
import { answer, route } from '@/lib/server/http';
import { askMap, presentMap } from '@/lib/server/maps';

/** Asks for a map: 200 with the stored one, 202 with one that is under way. */
export const POST = route({ role: 'planner', body: mapQuestionSchema }, async ({ actor, body }) => {
  const map = await askMap(actor, body);
  return answer(presentMap(map), { status: map.state === 'done' ? 200 : 202 });
});
