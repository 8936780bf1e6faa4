import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { revokeToken } from '@/lib/server/api-tokens/tokens';
import { route } from '@/lib/server/http';

const params = z.object({ tokenId: idSchema });

export const DELETE = route({ role: 'viewer', params }, ({ actor, params }) => revokeToken(actor, params.tokenId));
