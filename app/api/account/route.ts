import { getAccount } from '@/lib/server/accounts/data';
import { route } from '@/lib/server/http';

export const GET = route({ role: 'viewer' }, ({ actor }) => getAccount(actor));
