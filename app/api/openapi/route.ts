import { env } from '@/lib/server/env';
import { answer, route } from '@/lib/server/http';
import { openApiDocument } from '@/lib/server/openapi/document';
import { ROUTES } from './routes';

/** Public: what can be asked for is no secret, what is answered is. */
export const GET = route({ role: 'public' }, async () => answer(openApiDocument(ROUTES, env.APP_URL)));
