import { z } from 'zod';
import { memberChangeSchema } from '@/lib/contracts/accounts';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { changeMember } from '@/lib/server/members/change-member';
import { removeMember } from '@/lib/server/members/remove-member';

const params = z.object({ memberId: idSchema });

export const PATCH = route({ role: 'admin', params, body: memberChangeSchema }, ({ actor, params, body }) =>
  changeMember(actor, params.memberId, body),
);

export const DELETE = route({ role: 'admin', params }, ({ actor, params }) => removeMember(actor, params.memberId));
