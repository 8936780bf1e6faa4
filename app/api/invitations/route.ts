import { invitationRequestSchema } from '@/lib/contracts/accounts';
import { answer, route } from '@/lib/server/http';
import { createInvitation } from '@/lib/server/invitations/create-invitation';
import { listInvitations } from '@/lib/server/invitations/data';

export const GET = route({ role: 'admin' }, async ({ actor }) => ({ invitations: await listInvitations(actor) }));

export const POST = route({ role: 'admin', body: invitationRequestSchema }, async ({ actor, body }) =>
  answer(await createInvitation(actor, body), { status: 201 }),
);
