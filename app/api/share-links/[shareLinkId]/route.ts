import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { revokeShareLink } from '@/lib/server/share/share-links';

const params = z.object({ shareLinkId: idSchema });

/** Revokes the link; it stays in the list, so its answer is the link and not nothing. */
export const DELETE = route({ role: 'integrator', params }, ({ actor, params }) =>
  revokeShareLink(actor, params.shareLinkId),
);
