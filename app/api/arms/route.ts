import { listArms } from '@/lib/server/arms/data';
import { route } from '@/lib/server/http';

export const GET = route({ role: 'planner' }, async ({ actor }) => ({ arms: await listArms(actor) }));
