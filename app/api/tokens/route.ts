import { apiTokenRequestSchema } from '@/lib/contracts/api-tokens';
import { createToken, listTokens } from '@/lib/server/api-tokens/tokens';
import { answer, route } from '@/lib/server/http';

export const GET = route({ role: 'viewer' }, async ({ actor }) => ({ tokens: await listTokens(actor) }));

export const POST = route({ role: 'viewer', body: apiTokenRequestSchema }, async ({ actor, body }) =>
  answer(await createToken(actor, body), { status: 201 }),
);
