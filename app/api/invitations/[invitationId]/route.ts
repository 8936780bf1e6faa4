import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { revokeInvitation } from '@/lib/server/invitations/revoke-invitation';

const params = z.object({ invitationId: idSchema });

export const DELETE = route({ role: 'admin', params }, ({ actor, params }) =>
  revokeInvitation(actor, params.invitationId),
);
