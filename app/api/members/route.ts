import { route } from '@/lib/server/http';
import { listMembers } from '@/lib/server/members/data';

export const GET = route({ role: 'planner' }, async ({ actor }) => ({ members: await listMembers(actor) }));
